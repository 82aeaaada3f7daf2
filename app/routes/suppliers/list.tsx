import { href, Link } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Empty } from "#app/components/notice.tsx";
import { printDay } from "#app/components/when.tsx";
import { listSuppliers } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/list.ts";

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "supplier:see");
  const suppliers = await listSuppliers(context.get(dbContext), actor);
  return { suppliers, mayChange: can(actor.role, "supplier:change") };
}

export default function Suppliers({ loaderData }: Route.ComponentProps) {
  const { suppliers, mayChange } = loaderData;
  const add = mayChange ? (
    <ButtonLink look="main" to={href("/suppliers/new")}>
      Add a supplier
    </ButtonLink>
  ) : null;
  return (
    <>
      <PageHead title="Suppliers" lead="Whom the shop buys from." actions={add} />
      {suppliers.length === 0 ? (
        <Empty title="No suppliers yet" action={add}>
          Add one here, or name one while logging a delivery: it is kept for the next.
        </Empty>
      ) : (
        <ul className="divide-y divide-line overflow-hidden rounded-xl border border-line bg-surface">
          {suppliers.map((supplier) => (
            <li
              key={supplier.id}
              className="grid items-center gap-x-5 px-4 py-2 sm:grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)_16rem]"
            >
              <Link
                to={href("/suppliers/:supplierId", { supplierId: supplier.id })}
                className="inline-flex min-h-11 items-center break-words font-semibold text-ink text-lg underline-offset-4 hover:underline"
              >
                {supplier.name}
              </Link>
              <span className="break-words text-ink-soft">
                {[supplier.phone, supplier.email].filter(Boolean).join(" · ") || "no phone or e-mail"}
              </span>
              {supplier.deliveries > 0 ? (
                <Link
                  to={`${href("/deliveries")}?${new URLSearchParams({ supplier: supplier.id })}`}
                  className="inline-flex min-h-11 items-center text-link underline"
                >
                  {supplier.deliveries} {supplier.deliveries === 1 ? "delivery" : "deliveries"}
                  {supplier.lastReceivedOn ? `, last ${printDay(supplier.lastReceivedOn)}` : ""}
                </Link>
              ) : (
                <span className="text-ink-soft">no deliveries yet</span>
              )}
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
