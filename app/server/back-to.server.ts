/**
 * Where to go after a small action that several pages offer: the page it was pressed on, if that is one of ours, else the fallback.
 * Only the path is used, so no one can be led elsewhere.
 */
export function backTo(request: Request, fallback: string): string {
  const referer = request.headers.get("Referer");
  if (!referer || !URL.canParse(referer)) return fallback;
  const from = new URL(referer);
  if (from.host !== request.headers.get("Host")) return fallback;
  return `${from.pathname}${from.search}`;
}
