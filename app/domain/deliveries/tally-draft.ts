import { z } from "zod";
import { isBlank, mostRows, type TallyRow } from "./tally.ts";

const typed = (most: number) => z.string().max(most);

/** Rows of a tally as they travel: whatever was typed, read only when the tally is saved. */
export const tallyRows = z
  .array(
    z.object({
      count: typed(20),
      width: typed(80),
      length: typed(60),
      quarters: typed(12),
      species: typed(60),
    }),
  )
  .max(mostRows);

/** A half-typed tally as the server keeps it. */
export const keptDraft = z.object({
  rows: tallyRows,
  /** Counts how often the server has kept one. */
  version: z.number().int(),
  /** The opened page that wrote it. */
  writer: z.string(),
  byName: z.string(),
  /** ISO moment, null before anything was kept. */
  at: z.string().nullable(),
});

export type KeptDraft = z.infer<typeof keptDraft>;

/** The same tally as this device keeps it. */
export const localDraft = z.object({
  rows: tallyRows,
  /** The server's version that these rows were typed over. */
  base: z.number().int(),
  writer: z.string(),
  /** Whether something was typed that the server has not yet said it keeps. */
  unsent: z.boolean(),
});

export type LocalDraft = z.infer<typeof localDraft>;

/** Do two tallies say the same, blank rows apart? */
export function sameRows(a: TallyRow[], b: TallyRow[]): boolean {
  const plain = (rows: TallyRow[]) =>
    JSON.stringify(
      rows
        .filter((row) => !isBlank(row))
        .map(({ count, width, length, quarters, species }) => [count, width, length, quarters, species]),
    );
  return plain(a) === plain(b);
}

/** Has anything been typed? */
export function isEmptyTally(rows: TallyRow[]): boolean {
  return rows.every(isBlank);
}

/**
 * Which tally a page begins with: the server's, unless this device holds something the server never got. Where both have something the other has not,
 * a person decides.
 */
export function chooseDraft(local: LocalDraft | null, server: KeptDraft): "server" | "local" | "ask" {
  if (!local?.unsent || isEmptyTally(local.rows) || sameRows(local.rows, server.rows)) return "server";
  if (local.base === server.version || isEmptyTally(server.rows)) return "local";
  // The server kept what this device sent and the answer was lost.
  return server.writer === local.writer ? "local" : "ask";
}
