import { href, redirect } from "react-router";
import { removePhoto } from "#app/domain/photos/photos.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/remove-photo.ts";

export async function action({ params: { boardId, photoId }, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "photo:remove");
  if (!(await removePhoto(context.get(dbContext), context.get(storageContext), actor, boardId, photoId))) notHere();
  return redirect(href("/boards/:boardId", { boardId }));
}
