import { href, useLocation } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Empty } from "#app/components/notice.tsx";
import { Pager } from "#app/components/pager.tsx";
import { boardsPerPage, readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { BoardFilterForm } from "#app/domain/boards/board-filter-form.tsx";
import { BoardList } from "#app/domain/boards/board-list.tsx";
import { listBoards } from "#app/domain/boards/boards.sql.server.ts";
import { speciesInShop } from "#app/domain/boards/species-in-shop.sql.server.ts";
import { listOpenProjects } from "#app/domain/projects/projects.sql.server.ts";
import { listBays } from "#app/domain/rack/rack.sql.server.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/list.ts";

export async function loader({ context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "board:see");
  const db = context.get(dbContext);
  const filter = readBoardFilter(url.searchParams, shop.units);
  const [page, species, projects, bays] = await Promise.all([
    listBoards(db, actor, filter),
    speciesInShop(db, actor),
    listOpenProjects(db, actor),
    listBays(db, actor),
  ]);
  return { ...page, filter, species, projects, bays, mayReceive: can(actor.role, "delivery:receive") };
}

export default function Boards({ loaderData }: Route.ComponentProps) {
  const { boards, total, pages, filter, species, projects, bays, mayReceive } = loaderData;
  const { search } = useLocation();
  const page = Math.min(filter.page, pages);
  const from = (page - 1) * boardsPerPage;
  return (
    <>
      <PageHead
        title="Boards"
        lead={
          total === 0 ? "Nothing matches." : `${from + 1} to ${from + boards.length} of ${total.toLocaleString("en")}`
        }
        actions={
          <>
            {total > 0 ? (
              <ButtonLink to={`${href("/files/boards.csv")}${search}`} reloadDocument>
                Download CSV
              </ButtonLink>
            ) : null}
            {total > 0 && total <= 200 ? <ButtonLink to={`${href("/tags")}${search}`}>Print tags</ButtonLink> : null}
          </>
        }
      />
      <div className="grid items-start gap-5 lg:grid-cols-[17rem_minmax(0,1fr)]">
        <BoardFilterForm filter={filter} species={species} projects={projects} bays={bays} />
        <div>
          {boards.length > 0 ? (
            <BoardList boards={boards} />
          ) : (
            <Empty
              title={search ? "No board matches all of that" : "The rack is empty"}
              action={
                search ? (
                  <ButtonLink to={href("/boards")}>Show the whole rack</ButtonLink>
                ) : mayReceive ? (
                  <ButtonLink look="main" to={href("/deliveries/new")}>
                    Log a delivery
                  </ButtonLink>
                ) : null
              }
            >
              {search
                ? "Take a filter off, or look among boards that are out or used."
                : "Boards come in with a delivery: log one, tally it, and every board gets its tag."}
            </Empty>
          )}
          <Pager page={page} pages={pages} label="Pages of boards" />
        </div>
      </div>
    </>
  );
}
