import { z } from "zod";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { type LengthUnit, parseLength } from "#app/core/lengths/parse-length.ts";
import { boardStates } from "./board.ts";

/**
 * The state of the board list, all of it in the URL. Read by the loader, the filter form, its links and the CSV download.
 * A value that makes no sense falls back to "any": an old bookmark never breaks a page.
 */
const text = (max: number) => z.string().trim().max(max).catch("");

const id = z.string().regex(identifier).catch("");

const filterSchema = z.object({
  q: text(80),
  species: text(60),
  quarters: z.coerce.number().int().min(1).max(64).optional().catch(undefined),
  length: text(20),
  width: text(20),
  rings: z.enum(["flat", "rift", "quartered", "unread"]).optional().catch(undefined),
  state: z.enum([...boardStates, "any"]).catch("racked"),
  arm: id,
  moisture: z.coerce.number().min(0).max(100).optional().catch(undefined),
  figure: text(40),
  project: id,
  delivery: id,
  free: z.enum(["yes"]).optional().catch(undefined),
  sort: z.enum(["newest", "tag", "length", "width", "moisture", "angle"]).catch("newest"),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});

export interface BoardFilter extends Omit<z.infer<typeof filterSchema>, "length" | "width"> {
  /** As typed, so that the form shows it again. */
  length: string;
  width: string;
  minLengthMm: number | null;
  minWidthMm: number | null;
}

export const boardsPerPage = 50;

/** Reads the list's state from its address. Lengths are read in the shop's units; one that cannot be read filters nothing. */
export function readBoardFilter(params: URLSearchParams, unit: LengthUnit): BoardFilter {
  const given = Object.fromEntries([...params].filter(([, value]) => value !== ""));
  const filter = filterSchema.parse({
    q: "",
    species: "",
    length: "",
    width: "",
    arm: "",
    figure: "",
    project: "",
    delivery: "",
    ...given,
  });
  return { ...filter, minLengthMm: lengthOrNull(filter.length, unit), minWidthMm: lengthOrNull(filter.width, unit) };
}

function lengthOrNull(typed: string, unit: LengthUnit): number | null {
  if (typed === "") return null;
  const parsed = parseLength(typed, unit);
  return parsed.ok ? parsed.mm : null;
}
