import { Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { Pager } from "#app/components/pager.tsx";
import { printDay } from "#app/components/when.tsx";
import { boardsPerPage, readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { BoardList } from "#app/domain/boards/board-list.tsx";
import { listBoards } from "#app/domain/boards/boards.sql.server.ts";
import { ClaimCard } from "#app/domain/deliveries/claim-card.tsx";
import { shareCostAgain } from "#app/domain/deliveries/deliveries.server.ts";
import { getDelivery, listLot } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { checkClaim, deliveryTotalMinor } from "#app/domain/deliveries/delivery-cost.ts";
import { DeliveryFacts } from "#app/domain/deliveries/delivery-facts.tsx";
import { DocumentList } from "#app/domain/deliveries/document-list.tsx";
import { listDocuments } from "#app/domain/deliveries/documents.sql.server.ts";
import { LeftoverTally } from "#app/domain/deliveries/leftover-tally.tsx";
import { measureLot } from "#app/domain/deliveries/lot-measure.ts";
import { readTallyDraft } from "#app/domain/deliveries/tally-draft.server.ts";
import { ToTally } from "#app/domain/deliveries/to-tally.tsx";
import { printMoney } from "#app/domain/shop/money.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/delivery.ts";

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "delivery:see");
  const db = context.get(dbContext);
  const delivery = requireFound(await getDelivery(db, actor, params.deliveryId));
  const page = new URLSearchParams({ delivery: delivery.id, state: "any", sort: "tag" });
  page.set("page", url.searchParams.get("page") ?? "1");
  const filter = readBoardFilter(page, shop.units);
  const [lot, boards, documents, kept] = await Promise.all([
    listLot(db, actor, delivery.id),
    listBoards(db, actor, filter),
    listDocuments(db, actor, delivery.id),
    readTallyDraft(db, actor, delivery.id),
  ]);
  const { measured, groups } = measureLot(lot);
  return {
    delivery,
    documents,
    draftRows: kept?.draft.rows.length ?? 0,
    boards: { ...boards, page: Math.min(filter.page, boards.pages) },
    measured,
    groups,
    tags: lot.length > 0 ? { first: lot[0]?.tag, last: lot.at(-1)?.tag } : null,
    claim: delivery.talliedAt && lot.length > 0 ? checkClaim(delivery, measured) : null,
    totalMinor: deliveryTotalMinor(delivery, delivery.talliedAt ? measured : null),
    onBoardsMinor: lot.reduce((sum, board) => sum + (board.costMinor ?? 0), 0),
    mayChange: can(actor.role, "delivery:receive"),
    mayTally: can(actor.role, "delivery:tally"),
    mayDelete: can(actor.role, "delivery:delete") && !delivery.talliedAt,
    justTallied: url.searchParams.has("tallied"),
  };
}

/** Shares the cost out over the boards anew. */
export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "delivery:receive");
  const shared = await shareCostAgain(context.get(dbContext), actor, params.deliveryId);
  if (!shared.ok && shared.why === "missing") notHere();
  return redirect(href("/deliveries/:deliveryId", { deliveryId: params.deliveryId }));
}

export default function DeliveryPage({ loaderData }: Route.ComponentProps) {
  const { delivery, boards, documents, measured, groups, claim, tags, mayChange } = loaderData;
  const at = { deliveryId: delivery.id };
  const printTags = `${href("/tags")}?${new URLSearchParams({ delivery: delivery.id, state: "any" })}`;
  return (
    <>
      <PageHead
        title={`${delivery.supplierName}, ${printDay(delivery.receivedOn)}`}
        over={delivery.reference || "No reference"}
        actions={
          <>
            {tags ? (
              <ButtonLink look={loaderData.justTallied ? "main" : "plain"} to={printTags}>
                Print all tags
              </ButtonLink>
            ) : null}
            {mayChange ? <ButtonLink to={href("/deliveries/:deliveryId/edit", at)}>Change</ButtonLink> : null}
            {loaderData.mayDelete ? (
              <ButtonLink look="danger" to={href("/deliveries/:deliveryId/delete", at)}>
                Delete
              </ButtonLink>
            ) : null}
          </>
        }
      />
      {delivery.talliedAt ? (
        <LeftoverTally deliveryId={delivery.id} talliedAt={delivery.talliedAt.toISOString()} />
      ) : null}
      {loaderData.justTallied && tags ? (
        <Notice kind="good" title={tagWords(measured.count, tags)} className="mb-4">
          Print the tags and staple them on before the boards go up.
        </Notice>
      ) : null}
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="grid gap-4">
          {delivery.talliedAt ? (
            <ClaimCard measured={measured} groups={groups} claim={claim} />
          ) : (
            <ToTally delivery={delivery} draftRows={loaderData.draftRows} mayTally={loaderData.mayTally} />
          )}
          {boards.total > 0 ? (
            <section>
              <header className="mb-2 flex flex-wrap items-end justify-between gap-x-4">
                <h2 className="text-xl">
                  Its boards <span className="text-ink-soft">{boards.total}</span>
                </h2>
                {loaderData.mayTally ? (
                  <ButtonLink look="quiet" to={`${href("/deliveries/:deliveryId/tally", at)}?more`}>
                    Add boards that were missed
                  </ButtonLink>
                ) : null}
              </header>
              <BoardList boards={boards.boards} />
              <Pager page={boards.page} pages={boards.pages} label={`Pages of ${boardsPerPage} boards`} />
            </section>
          ) : null}
        </div>
        <div className="grid gap-4">
          <DeliveryFacts delivery={delivery} totalMinor={loaderData.totalMinor}>
            <ShareCost loaderData={loaderData} />
          </DeliveryFacts>
          <DocumentList deliveryId={delivery.id} documents={documents} mayChange={mayChange} />
        </div>
      </div>
    </>
  );
}

function tagWords(count: number, { first, last }: { first?: string; last?: string }): string {
  return count === 1 ? `One board, tag ${first}` : `${count} boards, tags ${first} to ${last}`;
}

/** What the boards carry, where that is not what the papers now say. */
function ShareCost({ loaderData }: Pick<Route.ComponentProps, "loaderData">) {
  const { currency } = useShop();
  const { totalMinor, onBoardsMinor, tags, mayChange } = loaderData;
  if (!tags || totalMinor === null || totalMinor === onBoardsMinor) return null;
  return (
    <Notice kind="caution" className="mt-3">
      <p>
        Its boards carry {printMoney(onBoardsMinor, currency)} together: the price changed since the tally, or the cost
        of a board was corrected by hand, or a board was deleted.
      </p>
      {mayChange ? (
        <Form method="post" className="mt-2">
          <Button>Share the cost out again</Button>
        </Form>
      ) : null}
    </Notice>
  );
}
