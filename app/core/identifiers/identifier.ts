/** The shape of every identifier: 13 digits and small letters. What looks otherwise is in no table, and some of it no table may even be asked for. */
export const identifier = /^[0-9abcdefghjkmnpqrstvwxyz]{13}$/;

/** Could this be an identifier of ours? */
export function isIdentifier(text: unknown): text is string {
  return typeof text === "string" && identifier.test(text);
}
