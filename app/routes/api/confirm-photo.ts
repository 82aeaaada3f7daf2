import { data } from "react-router";
import { confirmPhoto } from "#app/domain/photos/photos.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/confirm-photo.ts";

/** Takes in a photo that was sent. A refused one answers 422 with why. */
export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "photo:add");
  const result = await confirmPhoto(context.get(dbContext), context.get(storageContext), actor, params.photoId);
  if (!result.ok && result.why === "missing") notHere();
  return data(result, { status: result.ok ? 200 : 422 });
}
