import { z } from "zod";

/** The most a single problem may hold; more is refused at once rather than after minutes. */
export const PROBLEM_LIMITS = { boards: 20_000, parts: 5_000, pieces: 20_000 } as const;

const size = z.number().positive().max(1e6);
const length = z.number().min(0).max(1e6);
const money = z.number().min(0).max(1e12);
const id = z.string().min(1).max(200);
const quarters = z.union([z.string().min(1).max(20), z.number().positive()]);
const angle = z.number().min(-180).max(180);

const defect = z.object({ x: length, y: length, length: size, width: size });

const board = z.object({
  id,
  species: z.string().optional(),
  quarters: quarters.optional(),
  lot: z.string().optional(),
  length: size,
  width: size,
  cost: money,
  /** Added when the board is opened, beside boardCharge; no part of it comes back with an offcut. */
  charge: money.default(0),
  /** Ring angle in each of so many equal slices across the width, from y = 0; sides do not matter. */
  rings: z.array(angle).max(1000).optional(),
  defects: z.array(defect).max(200).default([]),
});

const ringWindow = z
  .object({
    min: z.number().min(0).max(90),
    max: z.number().min(0).max(90),
    share: z.number().min(0).max(1).default(1),
  })
  .refine((window) => window.min <= window.max, "the least ring angle is above the greatest");

const part = z.object({
  id,
  quantity: z.number().int().positive(),
  length: size,
  width: size,
  rotate: z.boolean().default(false),
  /** One species, or several of which any will do. */
  species: z.union([z.string(), z.array(z.string()).min(1)]).optional(),
  quarters: quarters.optional(),
  rings: ringWindow.optional(),
  plies: z.number().int().positive().max(50).default(1),
  sameBoard: z.boolean().default(false),
  /** Boards this part is fixed to: it may come from these and no others. */
  boards: z.array(id).min(1).optional(),
});

const problem = z.object({
  kerf: length.default(0),
  endTrim: length.default(0),
  edgeTrim: length.default(0),
  minOffcut: z.object({ length, width: length }).default({ length: 0, width: 0 }),
  boards: z.array(board),
  parts: z.array(part).min(1),
  /** Share of a board's cost by area that comes back with each offcut of at least minOffcut. */
  offcutCredit: z.number().min(0).max(1).default(0),
  boardCharge: money.default(0),
  stages: z.union([z.literal(2), z.literal(3)]).default(2),
  /** Seconds. */
  timeLimit: z.number().positive().max(3600).default(10),
});

/** A planning problem with its defaults filled in: millimetres, degrees, seconds, money in whatever unit cost is in. */
export type Problem = z.output<typeof problem>;
export type ProblemBoard = Problem["boards"][number];
export type ProblemPart = Problem["parts"][number];
export type RingWindow = NonNullable<ProblemPart["rings"]>;

/** The problem as it is written, before defaults. */
export type ProblemInput = z.input<typeof problem>;

/**
 * Reads a problem from parsed JSON, fills in defaults and refuses what cannot be meant.
 *
 * @returns the problem, or one line that says what is wrong and where.
 */
export function readProblem(input: unknown): { ok: true; problem: Problem } | { ok: false; error: string } {
  const tooMuch = tooLarge(input);
  if (tooMuch) return { ok: false, error: tooMuch };
  const parsed = problem.safeParse(input);
  if (!parsed.success) return { ok: false, error: firstIssue(parsed.error) };
  const wrong = contradiction(parsed.data);
  return wrong ? { ok: false, error: wrong } : { ok: true, problem: parsed.data };
}

function tooLarge(input: unknown): string | null {
  if (typeof input !== "object" || input === null || Array.isArray(input)) return "A problem is a JSON object.";
  const { boards, parts } = input as { boards?: unknown; parts?: unknown };
  if (Array.isArray(boards) && boards.length > PROBLEM_LIMITS.boards)
    return `boards: ${boards.length} are too many; a plan takes at most ${PROBLEM_LIMITS.boards}.`;
  if (Array.isArray(parts) && parts.length > PROBLEM_LIMITS.parts)
    return `parts: ${parts.length} are too many; a plan takes at most ${PROBLEM_LIMITS.parts}.`;
  return null;
}

function firstIssue(error: z.ZodError): string {
  const issue = error.issues[0]!;
  const where = issue.path.map((key) => (typeof key === "number" ? `[${key}]` : `.${String(key)}`)).join("");
  const more = error.issues.length > 1 ? ` (and ${error.issues.length - 1} more)` : "";
  return `${where.replace(/^\./, "") || "problem"}: ${issue.message}${more}`;
}

function contradiction({ boards, parts, endTrim, edgeTrim }: Problem): string | null {
  const boardIds = new Set<string>();
  for (const { id, length, width } of boards) {
    if (boardIds.has(id)) return `boards: "${id}" is there twice.`;
    boardIds.add(id);
    if (length <= 2 * endTrim || width <= 2 * edgeTrim) return `boards: nothing of "${id}" is left after the trims.`;
  }
  const partIds = new Set<string>();
  let pieces = 0;
  for (const [index, { id, quantity, plies, boards: fixed }] of parts.entries()) {
    if (partIds.has(id)) return `parts: "${id}" is there twice.`;
    partIds.add(id);
    const unknown = fixed?.find((boardId) => !boardIds.has(boardId));
    if (unknown !== undefined) return `parts[${index}].boards: there is no board "${unknown}".`;
    pieces += quantity * plies;
  }
  if (pieces > PROBLEM_LIMITS.pieces)
    return `parts: ${pieces} pieces are too many; a plan takes at most ${PROBLEM_LIMITS.pieces}.`;
  return null;
}
