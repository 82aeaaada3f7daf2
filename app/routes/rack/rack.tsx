import { href, Link, useSearchParams } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Empty } from "#app/components/notice.tsx";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { boardMeasure, printBoardFeet } from "#app/domain/boards/board-measure.ts";
import { listRacked } from "#app/domain/boards/boards.sql.server.ts";
import { armLoads } from "#app/domain/rack/arm-load.ts";
import { BayDrawing } from "#app/domain/rack/bay-drawing.tsx";
import { ChosenBoard } from "#app/domain/rack/chosen-board.tsx";
import { listBays } from "#app/domain/rack/rack.sql.server.ts";
import { RackFilter, readRackFilter } from "#app/domain/rack/rack-filter.tsx";
import { can } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/rack.ts";

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:see");
  const db = context.get(dbContext);
  const [bays, boards] = await Promise.all([listBays(db, actor), listRacked(db, actor)]);
  return {
    bays,
    boards,
    mayChange: can(actor.role, "rack:change"),
    mayReceive: can(actor.role, "delivery:receive"),
    mayReserve: can(actor.role, "hold:place"),
  };
}

export default function Rack({ loaderData }: Route.ComponentProps) {
  const { bays, boards, mayChange, mayReceive, mayReserve } = loaderData;
  const [params] = useSearchParams();
  const chosen = boards.find((board) => board.id === params.get("board")) ?? null;
  const filter = readRackFilter(params);
  const byArm = groupByArm(boards);
  const loads = armLoads(bays, byArm);
  const total = boards.reduce((sum, board) => sum + boardMeasure(board), 0);
  const projects = new Map(boards.flatMap((board) => board.holds).map((hold) => [hold.projectId, hold]));
  const linkTo = (boardId: string) => {
    const next = new URLSearchParams(params);
    next.set("board", boardId);
    return `?${next}`;
  };
  return (
    <>
      <PageHead
        title="The rack, end on"
        lead={`${boards.length} ${boards.length === 1 ? "board" : "boards"}, ${printBoardFeet(total)}${
          projects.size > 0
            ? `, some of it reserved for ${projects.size} ${projects.size === 1 ? "project" : "projects"}`
            : ""
        }`}
        actions={
          <>
            {mayReceive ? (
              <ButtonLink look="main" to={href("/deliveries/new")}>
                Log a delivery
              </ButtonLink>
            ) : null}
            {mayChange ? <ButtonLink to={href("/rack/bays/new")}>Add a bay</ButtonLink> : null}
          </>
        }
      />
      {bays.length === 0 ? (
        <Empty
          title="No bays yet"
          action={
            mayChange ? (
              <ButtonLink look="main" to={href("/rack/bays/new")}>
                Add the first bay
              </ButtonLink>
            ) : null
          }
        >
          Draw the rack as it stands: how many bays, how many arms each. Then boards are found where they lie.
        </Empty>
      ) : (
        <div className={chosen ? "grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_20rem]" : ""}>
          <div className="grid gap-4">
            <RackFilter filter={filter} projects={[...projects.values()]} />
            <Card>
              <div className="grid grid-cols-[repeat(auto-fit,minmax(min(100%,17rem),1fr))] gap-x-6 gap-y-8">
                {bays.map((bay) => (
                  <section key={bay.id}>
                    <h2 className="mb-2 flex items-baseline gap-3 text-lg">
                      Bay {bay.name} <span className="font-normal font-sans text-base text-ink-soft">{bay.note}</span>
                    </h2>
                    <BayDrawing
                      bay={bay}
                      boardsByArm={byArm}
                      loadByArm={loads}
                      chosen={chosen?.id ?? null}
                      faint={(board) => !filter.matches(board)}
                      linkTo={linkTo}
                    />
                  </section>
                ))}
              </div>
            </Card>
            <p className="text-ink-soft">
              Every board is also in the{" "}
              <Link to={href("/boards")} className="text-link underline">
                list of boards
              </Link>
              . Arm loads are reckoned from the boards' own sizes and the rating the shop entered; they do not say that
              a rack is safe.
            </p>
          </div>
          {chosen ? <ChosenBoard board={chosen} mayReserve={mayReserve} /> : null}
        </div>
      )}
    </>
  );
}

function groupByArm(boards: BoardSummary[]): Map<string, BoardSummary[]> {
  const byArm = new Map<string, BoardSummary[]>();
  for (const board of boards) {
    const key = board.armId ?? "";
    byArm.set(key, [...(byArm.get(key) ?? []), board]);
  }
  return byArm;
}
