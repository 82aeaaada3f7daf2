import { href } from "react-router";
import { z } from "zod";
import type { TallyRow } from "./tally.ts";
import { type KeptDraft, keptDraft } from "./tally-draft.ts";
import type { SendAnswer } from "./tally-keeper.ts";

const answers = z.union([
  z.object({ kept: z.literal(true), version: z.number() }),
  z.object({ kept: z.literal(false), why: z.literal("newer"), draft: keptDraft }),
  z.object({ kept: z.literal(false), why: z.literal("tallied") }),
]);
const seen = z.object({ talliedAt: z.string().nullable(), draft: keptDraft });

const addressOf = (deliveryId: string) => href("/api/deliveries/:deliveryId/tally-draft", { deliveryId });

/** Longer than this and a phone at the tailgate has no connection worth the name. */
const patienceMs = 15_000;

/** Which tally: of which delivery, and after which one before it, if there was one. */
export interface TallyOf {
  deliveryId: string;
  /** ISO moment of the tally before; null for the first. */
  after: string | null;
}

/** Sends a half-typed tally to the server. */
export async function sendDraft(
  { deliveryId, after }: TallyOf,
  draft: { rows: TallyRow[]; version: number; writer: string },
): Promise<SendAnswer> {
  const answer = await fetch(addressOf(deliveryId), {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify({ ...draft, after }),
    signal: AbortSignal.timeout(patienceMs),
  }).catch(() => null);
  if (!answer || answer.status >= 500) return { at: "unreachable" };
  const parsed = answers.safeParse(await answer.json().catch(() => null));
  if (!parsed.success) return { at: "refused" };
  if (parsed.data.kept) return { at: "kept", version: parsed.data.version };
  return parsed.data.why === "newer" ? { at: "newer", draft: parsed.data.draft } : { at: "tallied" };
}

/** The tally as the server keeps it now; null when it cannot be reached. */
export async function lookAtDraft({
  deliveryId,
  after,
}: TallyOf): Promise<{ isTallied: boolean; draft: KeptDraft } | null> {
  const answer = await fetch(addressOf(deliveryId), { signal: AbortSignal.timeout(patienceMs) }).catch(() => null);
  const parsed = seen.safeParse(await answer?.json().catch(() => null));
  return parsed.success ? { isTallied: parsed.data.talliedAt !== after, draft: parsed.data.draft } : null;
}
