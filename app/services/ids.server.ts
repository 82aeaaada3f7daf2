import { randomBytes } from "node:crypto";

/** Digits and lower-case letters without i, l, o and u: nothing is misread from a tag or spells a word. */
const alphabet = "0123456789abcdefghjkmnpqrstvwxyz";

const idLength = 13;

/**
 * A new public identifier: 13 characters of 5 random bits each, 65 bits, so it cannot be guessed.
 * It is the primary key everywhere, on purpose: nothing relies on keys being in order, so rows can be made on any machine.
 */
export function newId(): string {
  let id = "";
  for (const byte of randomBytes(idLength)) id += alphabet[byte & 31];
  return id;
}

/** A secret to be mailed or kept in a cookie: 256 random bits, URL-safe. */
export function newSecret(): string {
  return randomBytes(32).toString("base64url");
}
