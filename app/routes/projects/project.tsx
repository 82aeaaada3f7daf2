import { href, Link, Outlet } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { ProjectMark } from "#app/components/crayon.tsx";
import { Facts } from "#app/components/facts.tsx";
import { printDay } from "#app/components/when.tsx";
import { BoardList } from "#app/domain/boards/board-list.tsx";
import { boardMeasure, printBoardFeet } from "#app/domain/boards/board-measure.ts";
import { boardCosts, listHeldFor } from "#app/domain/boards/boards.sql.server.ts";
import { PartsTable } from "#app/domain/projects/parts-table.tsx";
import { getProject, listParts } from "#app/domain/projects/projects.sql.server.ts";
import { printMoney } from "#app/domain/shop/money.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/project.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "project:see");
  const db = context.get(dbContext);
  const project = requireFound(await getProject(db, actor, params.projectId));
  const [parts, boards] = await Promise.all([listParts(db, actor, project.id), listHeldFor(db, actor, project.id)]);
  const costs = can(actor.role, "cost:see")
    ? await boardCosts(
        db,
        actor,
        boards.map((board) => board.id),
      )
    : null;
  return {
    project,
    parts,
    boards,
    costMinor: costs && heldCost(boards, project.id, costs),
    mayChange: can(actor.role, "project:change"),
  };
}

type Held = Awaited<ReturnType<typeof listHeldFor>>;

/** The share of each board that the project holds, by length. */
function heldShare(board: Held[number], projectId: string): number {
  const held = board.holds
    .filter((hold) => hold.projectId === projectId)
    .reduce((sum, hold) => sum + hold.toMm - hold.fromMm, 0);
  return held / board.lengthMm;
}

function heldCost(boards: Held, projectId: string, costs: ReadonlyMap<string, number>): number {
  return Math.round(boards.reduce((sum, board) => sum + heldShare(board, projectId) * (costs.get(board.id) ?? 0), 0));
}

export default function ProjectPage({ loaderData }: Route.ComponentProps) {
  const { project, parts, boards, costMinor, mayChange } = loaderData;
  const { currency } = useShop();
  const measure = boards.reduce((sum, board) => sum + boardMeasure(board) * heldShare(board, project.id), 0);
  const at = { projectId: project.id };
  return (
    <>
      <PageHead
        title={project.name}
        over={project.client || "No client named"}
        lead={<ProjectMark name={`${project.crayon} crayon`} crayon={project.crayon} />}
        actions={
          mayChange ? (
            <>
              <ButtonLink look="main" to={href("/projects/:projectId/plan", at)}>
                Plan its boards
              </ButtonLink>
              <ButtonLink to={href("/projects/:projectId/change", at)}>Change</ButtonLink>
            </>
          ) : null
        }
      />
      <Outlet />
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="grid gap-4">
          <PartsTable parts={parts} projectId={project.id} mayChange={mayChange} />
          <Card
            title="Boards reserved"
            aside={
              boards.length > 0 ? (
                <Link
                  to={href("/projects/:projectId/take-down", at)}
                  className="inline-flex min-h-11 items-center text-link underline-offset-4 hover:underline"
                >
                  Take them down
                </Link>
              ) : null
            }
          >
            {boards.length > 0 ? (
              <BoardList boards={boards} />
            ) : (
              <p className="text-ink-soft">
                None yet. Open a board, on screen or by its tag at the rack, and reserve it, or a length of it, for this
                project.
              </p>
            )}
          </Card>
        </div>
        <Card>
          <Facts
            rows={[
              { label: "State", value: project.state },
              { label: "Due", value: project.dueOn ? printDay(project.dueOn) : "no date" },
              { label: "Reserved measure", value: printBoardFeet(measure) },
              ...(costMinor === null
                ? []
                : [{ label: "Cost of what is reserved", value: printMoney(costMinor, currency) }]),
            ]}
          />
          {project.notes ? <p className="mt-3 whitespace-pre-line">{project.notes}</p> : null}
          <ButtonLink
            to={`${href("/boards")}?${new URLSearchParams({ project: project.id, state: "any" })}`}
            className="mt-3"
          >
            Its boards in the list
          </ButtonLink>
        </Card>
      </div>
    </>
  );
}
