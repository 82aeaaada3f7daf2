import { env } from "#app/services/env.server.ts";

/** Does a request mean to change something? */
export function isWrite({ method }: Request): boolean {
  return method !== "GET" && method !== "HEAD";
}

/** Where a browser says that a request comes from: a page of ours, somebody else's page, or nothing said. No page can make a browser say otherwise. */
export function originOf(request: Request): "ours" | "foreign" | "unsaid" {
  const site = request.headers.get("Sec-Fetch-Site");
  if (site && site !== "same-origin" && site !== "none") return "foreign";
  const origin = request.headers.get("Origin");
  if (origin === null) return "unsaid";
  if (!URL.canParse(origin)) return "foreign";
  const { host } = new URL(origin);
  return host === request.headers.get("Host") || origin === new URL(env().PUBLIC_URL).origin ? "ours" : "foreign";
}
