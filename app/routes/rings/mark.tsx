import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { getPhoto } from "#app/domain/photos/photos.sql.server.ts";
import { marksForm, startingMarks } from "#app/domain/rings/read-marks.ts";
import { readingOf } from "#app/domain/rings/reading-of.server.ts";
import { RingMarker } from "#app/domain/rings/ring-marker.tsx";
import { keepReading } from "#app/domain/rings/rings.server.ts";
import { dbContext, ringReaderContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/mark.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "rings:read");
  const db = context.get(dbContext);
  const [board, photo] = await Promise.all([getBoard(db, actor, params.boardId), getPhoto(db, actor, params.photoId)]);
  if (!board || !photo || photo.boardId !== board.id) notHere();
  return { board, photo };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "rings:read");
  const db = context.get(dbContext);
  const board = requireFound(await getBoard(db, actor, params.boardId));
  const photo = requireFound(await getPhoto(db, actor, params.photoId));
  if (photo.boardId !== board.id) notHere();
  const form = marksForm.safeParse(Object.fromEntries(await request.formData()));
  if (!form.success) return data({ why: form.error.issues[0]?.message ?? "" }, { status: 400 });
  const services = { db, storage: context.get(storageContext), reader: context.get(ringReaderContext) };
  const read = await readingOf(services, actor, board, photo, form.data.marks, shop.classLimits);
  if (!read.ok) return data({ why: read.why }, { status: 400 });
  const { reading } = read;
  await keepReading(db, actor, board.id, reading, shop.classLimits, systemClock.now());
  return redirect(href("/boards/:boardId", { boardId: board.id }));
}

export default function MarkRings({ loaderData, actionData }: Route.ComponentProps) {
  const { board, photo } = loaderData;
  const src = href("/files/photos/:photoId/:size", { photoId: photo.id, size: "screen" });
  return (
    <>
      <PageHead title={`Rings of ${board.tag}`} over={photo.kind} />
      <Card>
        <ol className="mb-4 grid list-inside list-decimal gap-1 text-ink-soft">
          <li>
            Look whether the blue outline is the board's end, <LengthText mm={board.widthMm} unit={false} /> ×{" "}
            <LengthText mm={board.thicknessMm} />; drag a corner where it is not.
          </li>
          <li>
            Look whether the green lines follow the rings. Where they do not, draw along two or three real ones, or drag
            the pith.
          </li>
        </ol>
        {actionData ? (
          <Notice kind="wrong" title="Not kept" className="mb-4">
            {actionData.why}
          </Notice>
        ) : null}
        <Form method="post" className="grid gap-4">
          <RingMarker
            key={photo.id}
            photoId={photo.id}
            src={src}
            alt={`${board.tag}, ${photo.kind}: mark its corners and rings`}
            widthPx={photo.widthPx}
            heightPx={photo.heightPx}
            board={board}
            start={startingMarks(photo.widthPx, photo.heightPx)}
          />
          <noscript>
            <Notice kind="caution">Marking needs JavaScript. Without it, set the angle by eye.</Notice>
          </noscript>
          <div className="flex flex-wrap gap-3">
            <Button look="main" className="w-full sm:w-auto">
              Keep this reading
            </Button>
            <ButtonLink look="quiet" to={href("/boards/:boardId/rings/by-eye", { boardId: board.id })}>
              Set the angle by eye instead
            </ButtonLink>
            <ButtonLink look="quiet" to={href("/boards/:boardId", { boardId: board.id })}>
              Back to {board.tag}
            </ButtonLink>
          </div>
        </Form>
      </Card>
    </>
  );
}
