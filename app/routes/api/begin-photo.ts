import { data } from "react-router";
import { z } from "zod";
import { mostPhotoBytes, photoKinds } from "#app/domain/photos/photo.ts";
import { beginPhoto } from "#app/domain/photos/photos.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/begin-photo.ts";

const body = z.object({
  kind: z.enum(photoKinds),
  bytes: z.number().int().min(1).max(mostPhotoBytes),
  contentType: z.string().regex(/^image\/[a-z0-9.+-]{1,40}$/),
});

/** Announces a photo of a board; answers with the address to PUT it to. */
export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "photo:add");
  const parsed = body.safeParse(await request.json().catch(() => null));
  if (!parsed.success) throw data({ why: "wrong type" }, { status: 400 });
  const photo = { boardId: params.boardId, ...parsed.data };
  return requireFound(
    await beginPhoto(context.get(dbContext), context.get(storageContext), actor, photo, systemClock.now()),
  );
}
