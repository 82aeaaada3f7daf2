import { setTimeout as sleep } from "node:timers/promises";
import { type FakeLetter, listLetters, newestCode } from "#scripts/fakes/letters.ts";
import { mailFolder } from "#scripts/surroundings.ts";
import { chosenShop } from "./chosen-shop.ts";

const patienceMs = 10_000;

/**
 * The sign-in code that was mailed to somebody since a moment. Take the moment before the form is sent.
 *
 * @throws when none arrives in ten seconds.
 */
export function signInCode(email: string, since: Date): Promise<string> {
  return untilThere(`a sign-in code for ${email}`, async () =>
    newestCode(mailFolder(chosenShop().folder), email, since),
  );
}

/** The newest letter to somebody since a moment, to follow its link. @throws when none arrives in ten seconds. */
export function newestLetter(email: string, since: Date): Promise<FakeLetter> {
  return untilThere(`a letter to ${email}`, async () => {
    const letters = await listLetters(mailFolder(chosenShop().folder), { since });
    return letters.find(({ to }) => to === email.toLowerCase()) ?? null;
  });
}

async function untilThere<T>(what: string, look: () => Promise<T | null>): Promise<T> {
  for (let waitedMs = 0; waitedMs < patienceMs; waitedMs += 100) {
    const found = await look();
    if (found !== null) return found;
    await sleep(100);
  }
  throw new Error(`${what} did not arrive`);
}
