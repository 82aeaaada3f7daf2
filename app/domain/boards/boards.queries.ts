import { queryOptions } from "@tanstack/react-query";
import { href } from "react-router";
import { z } from "zod";
import { boardStates } from "./board.ts";

const foundBoard = z.object({
  id: z.string(),
  tag: z.string(),
  species: z.string(),
  quarters: z.number(),
  widthMm: z.number(),
  lengthMm: z.number(),
  place: z.string().nullable(),
  state: z.enum(boardStates),
});

export type FoundBoard = z.infer<typeof foundBoard>;

const availability = z.object({
  state: z.enum(boardStates),
  freeMm: z.number(),
  holds: z.array(z.object({ holdId: z.string(), expiresAt: z.string() })),
});

export type Availability = z.infer<typeof availability>;

/** The one way pages read our JSON: same origin, parsed, refused answers thrown. */
async function readJson<T>(address: string, schema: z.ZodType<T>, signal: AbortSignal): Promise<T> {
  const response = await fetch(address, { signal, headers: { Accept: "application/json" } });
  if (!response.ok) throw new Error(`answer ${response.status}`);
  return schema.parse(await response.json());
}

/** Boards found while typing. */
export function findBoardsQuery(typed: string) {
  return queryOptions({
    queryKey: ["boards", "find", typed],
    enabled: typed.trim() !== "",
    queryFn: ({ signal }) =>
      readJson(
        `${href("/api/boards")}?${new URLSearchParams({ q: typed })}`,
        z.object({ boards: z.array(foundBoard) }),
        signal,
      ),
  });
}

const askAgainMs = 10_000;

/** What of a board is free, asked again every few seconds while the page is in view. */
export function availabilityQuery(boardId: string) {
  return queryOptions({
    queryKey: ["boards", boardId, "availability"],
    refetchInterval: askAgainMs,
    queryFn: ({ signal }) => readJson(href("/api/boards/:boardId/availability", { boardId }), availability, signal),
  });
}
