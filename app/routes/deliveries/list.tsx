import { href, useLocation } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Empty } from "#app/components/notice.tsx";
import { Pager } from "#app/components/pager.tsx";
import { listDeliveries } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { deliveriesPerPage, readDeliveryFilter } from "#app/domain/deliveries/delivery-filter.ts";
import { DeliveryFilterForm } from "#app/domain/deliveries/delivery-filter-form.tsx";
import { DeliveryRows } from "#app/domain/deliveries/delivery-rows.tsx";
import { listSuppliers } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/list.ts";

export async function loader({ context, url }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:see");
  const db = context.get(dbContext);
  const filter = readDeliveryFilter(url.searchParams);
  const [page, suppliers] = await Promise.all([listDeliveries(db, actor, filter), listSuppliers(db, actor)]);
  return {
    ...page,
    filter,
    suppliers: suppliers.map(({ id, name }) => ({ id, name })),
    mayReceive: can(actor.role, "delivery:receive"),
  };
}

export default function Deliveries({ loaderData }: Route.ComponentProps) {
  const { deliveries, total, pages, filter, suppliers, mayReceive } = loaderData;
  const { search } = useLocation();
  const page = Math.min(filter.page, pages);
  const from = (page - 1) * deliveriesPerPage;
  const log = mayReceive ? (
    <ButtonLink look="main" to={href("/deliveries/new")}>
      Log a delivery
    </ButtonLink>
  ) : null;
  return (
    <>
      <PageHead
        title="Deliveries"
        lead={
          total > 0
            ? `${from + 1} to ${from + deliveries.length} of ${total.toLocaleString("en")}`
            : "What came in, from whom, and how it measured."
        }
        actions={
          <>
            {total > 0 ? (
              <ButtonLink to={`${href("/files/deliveries.csv")}${search}`} reloadDocument>
                Download CSV
              </ButtonLink>
            ) : null}
            <ButtonLink to={href("/suppliers")}>Suppliers</ButtonLink>
            {log}
          </>
        }
      />
      {total > 0 || search ? <DeliveryFilterForm filter={filter} suppliers={suppliers} /> : null}
      {deliveries.length > 0 ? (
        <DeliveryRows deliveries={deliveries} />
      ) : (
        <Empty title={search ? "No delivery matches all of that" : "No deliveries yet"} action={log}>
          {search
            ? "Take a filter off, or look for another word of the papers."
            : "Boards come in with a delivery: log the papers, tally it, and every board gets its tag."}
        </Empty>
      )}
      <Pager page={page} pages={pages} label="Pages of deliveries" />
    </>
  );
}
