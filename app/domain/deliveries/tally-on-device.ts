import { type LocalDraft, localDraft } from "./tally-draft.ts";

const keyOf = (deliveryId: string) => `rayfleck tally ${deliveryId}`;

/** The tally of a delivery that this device holds, or null. A browser that keeps nothing holds none. */
export function readOnDevice(deliveryId: string): LocalDraft | null {
  try {
    const parsed = localDraft.safeParse(JSON.parse(localStorage.getItem(keyOf(deliveryId)) ?? "null"));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}

/** Keeps a tally on this device. @returns false where the browser keeps nothing or is full. */
export function writeOnDevice(deliveryId: string, draft: LocalDraft): boolean {
  try {
    localStorage.setItem(keyOf(deliveryId), JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

export function forgetOnDevice(deliveryId: string): void {
  try {
    localStorage.removeItem(keyOf(deliveryId));
  } catch {
    // A browser that keeps nothing has nothing to forget.
  }
}
