import type { Env } from "#app/services/env.server.ts";

/** React Aria adds one rule of its own to a page: that a press does not wait for a second tap. It is the same text each time, so its hash lets it in. */
const pressableStyle = "sha256-38RhXrc7EdReTKsOm23ZPOCUgniTUUcjky8QOOrQx6o=";

/**
 * The Content-Security-Policy of every answer, a directive a line with its reason.
 *
 * @param nonce of this answer; React Router puts it on each script and style.
 * @param settings where files are served from.
 */
export function contentSecurityPolicy(nonce: string, settings: Pick<Env, "S3_BROWSER_ORIGIN" | "NODE_ENV">): string {
  const files = settings.S3_BROWSER_ORIGIN;
  const development = settings.NODE_ENV === "development";
  const directives: Record<string, string> = {
    "default-src": "'self'",
    "script-src": `'self' 'nonce-${nonce}'`,
    // The development server injects styles as it goes.
    "style-src": development ? "'self' 'unsafe-inline'" : `'self' 'nonce-${nonce}' '${pressableStyle}'`,
    // Inline style attributes: sizes of drawings.
    "style-src-attr": "'unsafe-inline'",
    // Photos come through our own addresses; a chosen file is previewed before it is sent.
    "img-src": "'self' blob: data:",
    "media-src": "'self' blob:",
    "font-src": "'self' data:",
    // Photos go straight to the file store.
    "connect-src": development ? `'self' ${files} ws:` : `'self' ${files}`,
    "object-src": "'none'",
    "base-uri": "'none'",
    "form-action": "'self'",
    "frame-ancestors": "'none'",
  };
  return Object.entries(directives)
    .map(([name, value]) => `${name} ${value}`)
    .join("; ");
}
