/**
 * One spelling for the many signs that keyboards and phones put into a size: lower case, `"` and `'` for inches and
 * feet, `x` between sizes, fraction signs (`¼`, `⅞`) as `1/4`, single spaces.
 */
export function plainText(typed: string): string {
  return typed
    .replace(/″|”|“|''|’’|′′/g, '"')
    .replace(/[′’‘]/g, "'")
    .replace(/[¼-¾⅐-⅞]/g, (sign) => ` ${sign.normalize("NFKC")}`)
    .normalize("NFKC")
    .toLowerCase()
    .replace(/⁄/g, "/")
    .replace(/[‐-―−]/g, "-")
    .replace(/×/g, "x")
    .replace(/\s+/g, " ")
    .trim();
}
