import { isEmptyTally, type LocalDraft, localDraft } from "./tally-draft.ts";
import type { TallyOf } from "./tally-requests.ts";

const beginning = (deliveryId: string) => `rayfleck tally ${deliveryId} `;
const keyOf = ({ deliveryId, after }: TallyOf) => beginning(deliveryId) + (after ?? "first");

/** The tally that this device holds, or null. A browser that keeps nothing holds none. */
export function readOnDevice(of: TallyOf): LocalDraft | null {
  return readKey(keyOf(of));
}

function readKey(key: string): LocalDraft | null {
  try {
    const parsed = localDraft.safeParse(JSON.parse(localStorage.getItem(key) ?? "null"));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Keeps a tally on this device. @returns false where the browser keeps nothing or is full. */
export function writeOnDevice(of: TallyOf, draft: LocalDraft): boolean {
  try {
    localStorage.setItem(keyOf(of), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

/**
 * Forgets the tallies of a delivery that were saved meanwhile, but not rows that never reached the shop: those come back.
 *
 * @param of the tally that would come next.
 */
export function leftOnDevice(of: TallyOf): LocalDraft["rows"] {
  return earlierKeys(of).flatMap((key) => {
    const held = readKey(key);
    if (held?.unsent && !isEmptyTally(held.rows)) return held.rows;
    localStorage.removeItem(key);
    return [];
  });
}

/** Forgets the tallies of a delivery before the one that would come next, whatever is in them. */
export function forgetLeft(of: TallyOf): void {
  for (const key of earlierKeys(of)) localStorage.removeItem(key);
}

function earlierKeys(of: TallyOf): string[] {
  try {
    const keys = Array.from({ length: localStorage.length }, (_, index) => localStorage.key(index) ?? "");
    return keys.filter((key) => key.startsWith(beginning(of.deliveryId)) && key !== keyOf(of));
  } catch {
    return [];
  }
}
