import { href, redirect } from "react-router";
import { removePhoto } from "#app/domain/photos/photos.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/remove-photo.ts";

export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "photo:remove");
  const removed = requireFound(
    await removePhoto(context.get(dbContext), context.get(storageContext), actor, params.photoId),
  );
  return redirect(href("/boards/:boardId", { boardId: removed.boardId }));
}
