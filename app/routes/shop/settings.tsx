import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { shopForm } from "#app/domain/shop/shop.schema.ts";
import { ShopFields, shopDefaults } from "#app/domain/shop/shop-fields.tsx";
import { changeShop } from "#app/domain/shop/shops.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { formVersion, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/settings.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  const { shop } = requireRole(context, "shop:settings");
  return { shop, saved: url.searchParams.has("saved") };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "shop:settings");
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: shopForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply(), stale: false }, { status: 400 });
  const kept = await changeShop(context.get(dbContext), actor, formVersion(formData), submission.value);
  if (!kept) return data({ result: submission.reply(), stale: true }, { status: 409 });
  return redirect(`${href("/settings")}?saved`);
}

export default function Settings({ loaderData, actionData }: Route.ComponentProps) {
  const { shop, saved } = loaderData;
  const [form, fields] = useForm<Record<string, string>>({
    id: `shop-${shop.version}`,
    lastResult: actionData?.result,
    defaultValue: shopDefaults(shop),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: shopForm(shop.units) }) as never,
    shouldRevalidate: "onInput",
  });
  return (
    <>
      <PageHead title="Shop settings" lead="How this shop writes sizes, what it cuts away, what its machines can do." />
      {saved && !actionData ? <Notice kind="good" title="Saved" className="mb-4" /> : null}
      {actionData?.stale ? (
        <Notice kind="wrong" title="Another owner saved settings while you wrote" className="mb-4">
          What you typed is still here. Open this page anew in another tab to see theirs, then save again.
        </Notice>
      ) : null}
      <Form method="post" {...getFormProps(form)} className="grid max-w-4xl gap-4">
        <input type="hidden" name="version" value={shop.version} />
        <ShopFields fields={fields} units={shop.units} />
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Save
        </Button>
      </Form>
    </>
  );
}
