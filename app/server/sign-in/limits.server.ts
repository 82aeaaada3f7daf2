import type { Knex } from "knex";
import { clientAddress } from "#app/services/client-address.server.ts";
import { type Limit, takeOne } from "../rate-limit.server.ts";

/** Letters to one address: enough for somebody whose mail is slow, too few to bury anybody. */
const lettersTo: Limit = { name: "code to", most: 5, windowMinutes: 15 };

/** Letters asked for from one place: a whole workshop behind one router, not a list of addresses. */
const lettersFrom: Limit = { name: "codes from", most: 30, windowMinutes: 15 };

/** Guesses from one place, over all challenges. */
const guessesFrom: Limit = { name: "guesses from", most: 60, windowMinutes: 15 };

/** May another code be mailed? The same for addresses with and without an account. */
export async function mayMail(db: Knex, request: Request, email: string, now: Date): Promise<boolean> {
  const from = await takeOne(db, lettersFrom, clientAddress(request), now);
  return (await takeOne(db, lettersTo, email, now)) && from;
}

/** May this place guess again? */
export function mayGuess(db: Knex, request: Request, now: Date): Promise<boolean> {
  return takeOne(db, guessesFrom, clientAddress(request), now);
}

/** Invitations of one shop: nobody hires forty people in a day. */
const invitationsOf: Limit = { name: "invitations of", most: 40, windowMinutes: 24 * 60 };

/** May this shop ask somebody in? */
export function mayInvite(db: Knex, shopId: string, now: Date): Promise<boolean> {
  return takeOne(db, invitationsOf, shopId, now);
}
