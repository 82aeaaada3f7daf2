import { Form, href, Outlet } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card } from "#app/components/card.tsx";
import { toPanel } from "#app/components/panel.tsx";
import { Availability } from "#app/domain/boards/availability.tsx";
import { listEvents } from "#app/domain/boards/board-events.server.ts";
import { BoardFacts } from "#app/domain/boards/board-facts.tsx";
import { BoardHero } from "#app/domain/boards/board-hero.tsx";
import { BoardHistory } from "#app/domain/boards/board-history-list.tsx";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { DefectList } from "#app/domain/boards/defect-list.tsx";
import { listDefects } from "#app/domain/boards/defects.sql.server.ts";
import { GradeCard } from "#app/domain/grade/grade-card.tsx";
import { freeLengthMm } from "#app/domain/holds/hold.ts";
import { HoldCards } from "#app/domain/holds/hold-cards.tsx";
import { boardReadiness } from "#app/domain/moisture/board-readiness.ts";
import { listMoistureReadings } from "#app/domain/moisture/moisture.sql.server.ts";
import { MoistureCard } from "#app/domain/moisture/moisture-card.tsx";
import { placeFor, readPlace } from "#app/domain/moisture/places.ts";
import { boardMovement } from "#app/domain/movement/board-movement.ts";
import { MovementCard } from "#app/domain/movement/movement-card.tsx";
import { PhotoStrip } from "#app/domain/photos/photo-strip.tsx";
import { listPhotos } from "#app/domain/photos/photos.sql.server.ts";
import { RingCard } from "#app/domain/rings/ring-card.tsx";
import { currentReadings } from "#app/domain/rings/rings.sql.server.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { boardWeight } from "#app/domain/weight/board-weight.ts";
import { WeightCard } from "#app/domain/weight/weight-card.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/board.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "board:see");
  const db = context.get(dbContext);
  const board = requireFound(await getBoard(db, actor, params.boardId));
  const [events, photos, readings, moisture, defects] = await Promise.all([
    listEvents(db, actor, board.id, 40),
    listPhotos(db, actor, board.id),
    currentReadings(db, actor, board.id),
    listMoistureReadings(db, actor, board.id),
    listDefects(db, actor, board.id),
  ]);
  const place = placeFor(readPlace(url.searchParams.get("place")), shop);
  const readiness = boardReadiness(moisture, shop, place, systemClock.now());
  const worked = { readiness, movement: boardMovement(board, place), weight: boardWeight(board) };
  return { board, events, photos, readings, moisture, defects, worked, role: actor.role, personId: actor.personId };
}

export default function BoardPage({ loaderData }: Route.ComponentProps) {
  const { board, events, photos, readings, moisture, defects, worked, role, personId } = loaderData;
  const boardId = board.id;
  return (
    <article>
      <BoardHero board={board} />
      <BoardActions board={board} mayReserve={can(role, "hold:place")} />
      <Outlet />
      <div className="mt-4 grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid gap-4">
          <Card
            title="Spoken for"
            aside={
              <Availability
                boardId={boardId}
                lengthMm={board.lengthMm}
                drawn={{
                  state: board.state,
                  holdIds: board.holds.map((hold) => hold.holdId),
                  freeMm: freeLengthMm(board.lengthMm, board.holds),
                }}
              />
            }
          >
            <HoldCards board={board} role={role} personId={personId} />
          </Card>
          <RingCard board={board} readings={readings} mayRead={can(role, "rings:read")} />
          <PhotoStrip boardId={boardId} tag={board.tag} photos={photos} mayRemove={can(role, "photo:remove")} />
          <MoistureCard boardId={boardId} readings={moisture} readiness={worked.readiness} />
          <MovementCard species={board.species} movement={worked.movement} />
          <DefectList board={board} defects={defects} mayNote={can(role, "board:correct")} />
          <GradeCard board={board} defects={defects} />
          <BoardHistory events={events} />
        </div>
        <div className="contents gap-4 lg:grid">
          <BoardFacts board={board} role={role} />
          <WeightCard weight={worked.weight} />
          <div className="flex flex-wrap gap-2">
            {can(role, "tag:print") ? (
              <ButtonLink to={`${href("/tags")}?board=${boardId}`}>Print the tag</ButtonLink>
            ) : null}
            {can(role, "board:correct") ? (
              <ButtonLink to={href("/boards/:boardId/mark", { boardId }) + toPanel}>Used, sold or lost</ButtonLink>
            ) : null}
            {can(role, "board:correct") && (board.state === "out" || board.state === "used") ? (
              <ButtonLink to={href("/boards/:boardId/offcut", { boardId }) + toPanel}>An offcut came back</ButtonLink>
            ) : null}
            {can(role, "board:delete") ? (
              <ButtonLink look="danger" to={href("/boards/:boardId/delete", { boardId })}>
                Delete
              </ButtonLink>
            ) : null}
          </div>
        </div>
      </div>
    </article>
  );
}

interface BoardActionsProps {
  board: { id: string; state: string };
  mayReserve: boolean;
}

/** What people do with a board at the rack; the main action is full width under a thumb. */
function BoardActions({ board, mayReserve }: BoardActionsProps) {
  const at = { boardId: board.id };
  const racked = board.state === "racked";
  return (
    <div className="mt-4 grid gap-2 md:flex md:flex-wrap" data-screen-only>
      {mayReserve && racked ? (
        <ButtonLink
          look="main"
          to={href("/boards/:boardId/reserve", at)}
          className="min-h-14 text-lg md:min-h-11 md:text-base"
        >
          Reserve for a project
        </ButtonLink>
      ) : null}
      <div className="grid grid-cols-3 gap-2 md:flex">
        <ButtonLink className="px-2! md:px-4!" to={href("/boards/:boardId/moisture", at) + toPanel}>
          Moisture
        </ButtonLink>
        <ButtonLink className="px-2! md:px-4!" to={href("/boards/:boardId/move", at) + toPanel}>
          Move
        </ButtonLink>
        {racked || board.state === "out" ? (
          <Form method="post" action={href("/boards/:boardId/state", at)} className="grid">
            <Button
              className="whitespace-nowrap px-2! md:px-4!"
              name="intent"
              value={racked ? "take down" : "put back"}
            >
              {racked ? "Take down" : "Put back"}
            </Button>
          </Form>
        ) : null}
      </div>
    </div>
  );
}
