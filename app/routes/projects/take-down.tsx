import { Form, href, Link } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Empty } from "#app/components/notice.tsx";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { BoardSize, LengthText } from "#app/domain/boards/size-text.tsx";
import { takeDownList } from "#app/domain/holds/take-down-list.sql.server.ts";
import { getProject } from "#app/domain/projects/projects.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/take-down.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:take-down");
  const db = context.get(dbContext);
  const project = requireFound(await getProject(db, actor, params.projectId));
  return { project, boards: await takeDownList(db, actor, project.id) };
}

export default function TakeDown({ loaderData }: Route.ComponentProps) {
  const { project, boards } = loaderData;
  const out = boards.filter((board) => board.state === "out").length;
  const back = (
    <ButtonLink to={href("/projects/:projectId", { projectId: project.id })}>Back to the project</ButtonLink>
  );
  return (
    <>
      <PageHead
        title={`Take down for ${project.name}`}
        lead={
          boards.length === 0
            ? undefined
            : `${out} of ${boards.length} out. In the order they lie: bay by bay, top arm first.`
        }
        actions={
          <>
            <ButtonLink look="main" to={href("/scan")}>
              Scan a tag
            </ButtonLink>
            {back}
          </>
        }
      />
      {boards.length === 0 ? (
        <Empty title="Nothing is reserved yet" action={back}>
          Plan the project's boards, or reserve one at the rack; then they stand here in order.
        </Empty>
      ) : (
        <ol className="grid gap-3">
          {boards.map((board) => (
            <BoardToTakeDown key={board.id} board={board} projectId={project.id} />
          ))}
        </ol>
      )}
    </>
  );
}

function BoardToTakeDown({ board, projectId }: { board: BoardSummary; projectId: string }) {
  const held = board.holds.filter((hold) => hold.projectId === projectId);
  const racked = board.state === "racked";
  return (
    <li className="grid gap-3 rounded-xl border border-line bg-surface p-4 sm:grid-cols-[minmax(0,1fr)_auto] sm:items-center">
      <div>
        <p className="font-mono text-ink-soft text-sm">{board.place ?? "no place recorded"}</p>
        <p className="flex flex-wrap items-center gap-x-3">
          <Link
            to={href("/boards/:boardId", { boardId: board.id })}
            className="font-bold font-display text-ink text-xl"
          >
            {board.tag}
          </Link>
          <BoardEnd board={board} heightPx={22} />
          <BoardSize board={board} />
        </p>
        <p className="text-ink-soft">
          {held.map((hold, index) => (
            <span key={hold.holdId}>
              {index > 0 ? ", " : "Held: "}
              <LengthText mm={hold.fromMm} unit={false} /> to <LengthText mm={hold.toMm} />
            </span>
          ))}{" "}
          from the near end
        </p>
      </div>
      {racked || board.state === "out" ? (
        <Form method="post" action={href("/boards/:boardId/state", { boardId: board.id })} className="grid">
          <Button
            look={racked ? "main" : "plain"}
            name="intent"
            value={racked ? "take down" : "put back"}
            className="min-h-14 sm:min-h-11"
          >
            {racked ? "Take down" : "Put back"}
          </Button>
        </Form>
      ) : null}
    </li>
  );
}
