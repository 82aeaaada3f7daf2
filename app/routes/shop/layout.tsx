import { Outlet } from "react-router";
import { ErrorPage } from "#app/components/error-page.tsx";
import { ShopHeader } from "#app/components/shop-header.tsx";
import { Unsent } from "#app/components/unsent.tsx";
import { FindBoard } from "#app/domain/boards/find-board.tsx";
import { can } from "#app/domain/shop/permissions.ts";
import { ShopViewProvider } from "#app/domain/shop/shop-view.tsx";
import { requireAtWork } from "#app/server/at-work.server.ts";
import { atWorkContext } from "#app/server/context.server.ts";
import type { Route } from "./+types/layout.ts";

export const middleware: Route.MiddlewareFunction[] = [requireAtWork];

export function loader({ context }: Route.LoaderArgs) {
  const { actor, shop } = context.get(atWorkContext);
  return {
    personName: actor.personName,
    role: actor.role,
    shop: {
      name: shop.name,
      units: shop.units,
      currency: shop.currency,
      classLimits: shop.classLimits,
      role: actor.role,
    },
  };
}

export default function ShopLayout({ loaderData }: Route.ComponentProps) {
  const { shop, personName, role } = loaderData;
  return (
    <ShopViewProvider value={shop}>
      <ShopHeader
        shopName={shop.name}
        personName={personName}
        role={role}
        find={<FindBoard />}
        sees={{
          deliveries: can(role, "delivery:see"),
          settings: can(role, "shop:settings"),
          people: can(role, "shop:people"),
        }}
      />
      <main id="content" tabIndex={-1} className="page outline-none">
        <Outlet />
      </main>
      <Unsent />
    </ShopViewProvider>
  );
}

/** A refusal or a missing record keeps the shop's header, so that a person can go on from there. */
export function ErrorBoundary({ error, loaderData }: Route.ErrorBoundaryProps) {
  return (
    <>
      {loaderData ? (
        <ShopHeader
          shopName={loaderData.shop.name}
          personName={loaderData.personName}
          role={loaderData.role}
          sees={{ deliveries: can(loaderData.role, "delivery:see"), settings: false, people: false }}
        />
      ) : null}
      <ErrorPage error={error} />
    </>
  );
}
