import { Form, href, redirect } from "react-router";
import { z } from "zod";
import { ButtonLink } from "#app/components/button.tsx";
import { FrontDoor } from "#app/components/front-door.tsx";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { membershipOf, shopsOf } from "#app/domain/people/people.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireVisit } from "#app/server/guards.server.ts";
import { chooseShop } from "#app/server/session.server.ts";
import type { Route } from "./+types/choose.ts";

const form = z.object({ shopId: z.string().regex(identifier) });

export async function loader({ context, url }: Route.LoaderArgs) {
  const visit = requireVisit(context, url);
  const shops = await shopsOf(context.get(dbContext), visit.personId);
  if (shops.length === 0) throw redirect(href("/shops/new"));
  return { shops, current: visit.shopId };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const visit = requireVisit(context, url);
  const db = context.get(dbContext);
  const parsed = form.safeParse(Object.fromEntries(await request.formData()));
  if (!parsed.success || !(await membershipOf(db, visit.personId, parsed.data.shopId))) notHere();
  await chooseShop(db, visit, parsed.data.shopId);
  return redirect(href("/rack"));
}

export default function ChooseShop({ loaderData }: Route.ComponentProps) {
  const { shops, current } = loaderData;
  return (
    <FrontDoor title="Which shop">
      <Form method="post" className="grid gap-2">
        {shops.map((shop) => (
          <button
            key={shop.id}
            type="submit"
            name="shopId"
            value={shop.id}
            className="flex min-h-14 items-center justify-between gap-4 rounded-xl border border-line-strong bg-surface px-4 text-left hover:bg-sunk"
          >
            <span className="font-display font-semibold text-lg">{shop.name}</span>
            <span className="text-ink-soft">
              {shop.role}
              {shop.id === current ? ", here now" : ""}
            </span>
          </button>
        ))}
      </Form>
      <ButtonLink to={href("/shops/new")}>Open another shop</ButtonLink>
      <Form method="post" action={href("/sign-out")}>
        <button type="submit" className="min-h-11 text-link underline">
          Sign out
        </button>
      </Form>
    </FrontDoor>
  );
}
