import { isIPv6 } from "node:net";
import type { Knex } from "knex";
import { clientAddress } from "#app/services/client-address.server.ts";
import { type Limit, takeOne } from "../rate-limit.server.ts";

const day = 24 * 60;

/** Letters to one address: enough for somebody whose mail is slow, too few to bury anybody. */
const lettersTo: Limit = { name: "code to", most: 5, windowMinutes: 15 };

/** Letters asked for from one place: a whole workshop behind one router, not a list of addresses. */
const lettersFrom: Limit = { name: "codes from", most: 30, windowMinutes: 15 };

/** Guesses from one place, over all challenges. */
const guessesFrom: Limit = { name: "guesses from", most: 60, windowMinutes: 15 };

/** Codes tried for one address, over all its letters and from everywhere: fifty in a million a day. Its links still work, so nobody can be shut out. */
const guessesAt: Limit = { name: "guesses at", most: 50, windowMinutes: day };

/** Invitations of one shop: nobody hires forty people in a day. */
const invitationsOf: Limit = { name: "invitations of", most: 40, windowMinutes: day };

/** Invitations to one address, from whatever shops: anybody may open a shop and send some. */
const invitationsTo: Limit = { name: "invitations to", most: 5, windowMinutes: day };

/** Shops that one person opens. */
const shopsBy: Limit = { name: "shops by", most: 10, windowMinutes: day };

/**
 * What a limit by place counts as one: an IPv4 address, or the network (the first 64 bits) of an IPv6 one, since whoever has one address of it has them all.
 */
export function placeOf(address: string): string {
  if (!isIPv6(address)) return address;
  const asV4 = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address)?.[1];
  if (asV4) return asV4;
  const [before = [], after] = address.split("::").map((part) => (part === "" ? [] : part.split(":")));
  const zeros = after ? Array.from({ length: 8 - before.length - after.length }, () => "0") : [];
  const network = [...before, ...zeros, ...(after ?? [])].slice(0, 4);
  return network.map((group) => Number.parseInt(group, 16).toString(16)).join(":");
}

/** May another code be mailed? The same for addresses with and without an account. */
export async function mayMail(db: Knex, request: Request, email: string, now: Date): Promise<boolean> {
  if (!(await takeOne(db, lettersFrom, placeOf(clientAddress(request)), now))) return false;
  return takeOne(db, lettersTo, email, now);
}

/** May this place try another code, and may another be tried for this address? Asked before the code is looked at. */
export async function mayGuess(
  db: Knex,
  request: Request,
  email: string,
  now: Date,
): Promise<"yes" | "place" | "address"> {
  if (!(await takeOne(db, guessesFrom, placeOf(clientAddress(request)), now))) return "place";
  return (await takeOne(db, guessesAt, email, now)) ? "yes" : "address";
}

/** May this shop ask somebody in at this address? */
export async function mayInvite(db: Knex, shopId: string, email: string, now: Date): Promise<boolean> {
  if (!(await takeOne(db, invitationsOf, shopId, now))) return false;
  return takeOne(db, invitationsTo, email, now);
}

/** May this person open another shop? */
export function mayOpenShop(db: Knex, personId: string, now: Date): Promise<boolean> {
  return takeOne(db, shopsBy, personId, now);
}
