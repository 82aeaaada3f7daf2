import { data } from "react-router";
import { z } from "zod";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { getPhoto } from "#app/domain/photos/photos.sql.server.ts";
import { readPhoto } from "#app/domain/rings/photo-reading.server.ts";
import { picturePoint } from "#app/domain/rings/read-marks.ts";
import { dbContext, ringReaderContext, storageContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/read-rings.ts";

const body = z.object({ corners: z.array(picturePoint).length(4).optional() });

/** Reads the rings on a photo, with the corners a person dragged or by itself. Keeps nothing: the page shows it and asks. */
export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "rings:read");
  const parsed = body.safeParse(await request.json().catch(() => null));
  if (!parsed.success) throw data({ why: "corners" }, { status: 400 });
  const services = {
    db: context.get(dbContext),
    storage: context.get(storageContext),
    reader: context.get(ringReaderContext),
  };
  const photo = requireFound(await getPhoto(services.db, actor, params.photoId));
  const board = requireFound(await getBoard(services.db, actor, photo.boardId));
  return requireFound(await readPhoto(services, actor, board, photo.id, shop.classLimits, parsed.data.corners));
}
