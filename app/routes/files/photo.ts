import { z } from "zod";
import { photoKey } from "#app/domain/photos/photos.sql.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/photo.ts";

const sizes = z.enum(["small", "screen", "original"]);

/** One size of a photo, for those who may see its board. A photo never changes, so the browser may keep it; nobody in between may. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:see");
  const size = sizes.safeParse(params.size);
  if (!size.success) notHere();
  const key = requireFound(await photoKey(context.get(dbContext), actor, params.photoId, size.data));
  const file = requireFound(await context.get(storageContext).stream(key));
  return new Response(file.body, {
    headers: {
      "Content-Type": file.contentType,
      "Content-Length": String(file.bytes),
      "Cache-Control": "private, max-age=31536000, immutable",
      // A picture is only ever shown: should a browser take it for a page, nothing in it runs.
      // The styles are those with which a browser centres a picture that is a page by itself.
      "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'; sandbox",
    },
  });
}
