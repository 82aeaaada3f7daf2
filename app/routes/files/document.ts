import { getDocument } from "#app/domain/deliveries/documents.sql.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/document.ts";

/**
 * One paper of a delivery, for those who may see deliveries. A picture is shown; a PDF is handed over as a file, as browsers show none inside the
 * sandbox that keeps whatever is in it from acting as a page of ours.
 */
export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:see");
  const document = requireFound(await getDocument(context.get(dbContext), actor, params.documentId, "ready"));
  const file = requireFound(await context.get(storageContext).stream(document.objectKey));
  const how = document.contentType.startsWith("image/") ? "inline" : "attachment";
  return new Response(file.body, {
    headers: {
      "Content-Type": document.contentType,
      "Content-Length": String(file.bytes),
      "Content-Disposition": `${how}; ${fileName(document.name)}`,
      "Cache-Control": "private, max-age=31536000, immutable",
      "X-Content-Type-Options": "nosniff",
      // The styles are those with which a browser centres a picture that is a page by itself.
      "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'; sandbox",
    },
  });
}

/** A file's name in a header: letters beyond ASCII are written as RFC 6266 says, beside a plain one for what does not read that. */
function fileName(name: string): string {
  const plain = name.replace(/[^\x20-\x7e]|["\\]/g, "_");
  const coded = encodeURIComponent(name).replace(
    /['()*]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `filename="${plain}"; filename*=UTF-8''${coded}`;
}
