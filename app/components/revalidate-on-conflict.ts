import type { ShouldRevalidateFunctionArgs } from "react-router";

/**
 * After a refused form the framework reads nothing anew. A 409 is the exception: somebody else changed what the page shows, so it is read again, and the
 * form's next try is made from what is true now. What was typed stays.
 */
export function revalidateOnConflict({ actionStatus, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  return actionStatus === 409 || defaultShouldRevalidate;
}
