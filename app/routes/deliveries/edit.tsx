import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect, useNavigation } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { printDay, When } from "#app/components/when.tsx";
import { changeDelivery } from "#app/domain/deliveries/deliveries.server.ts";
import { getDelivery } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { deliveryForm } from "#app/domain/deliveries/delivery.schema.ts";
import { DeliveryFields, deliveryDefaults } from "#app/domain/deliveries/delivery-fields.tsx";
import { listSuppliers } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { formVersion, notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/edit.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:receive");
  const db = context.get(dbContext);
  const delivery = requireFound(await getDelivery(db, actor, params.deliveryId));
  const suppliers = await listSuppliers(db, actor);
  return { delivery, suppliers: suppliers.map(({ id, name }) => ({ id, name })) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "delivery:receive");
  const db = context.get(dbContext);
  requireFound(await getDelivery(db, actor, params.deliveryId));
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: deliveryForm(shop) });
  if (submission.status !== "success") return data({ result: submission.reply(), stale: null }, { status: 400 });
  const version = formVersion(formData);
  const changed = await changeDelivery(db, actor, params.deliveryId, version, submission.value, systemClock.now());
  if (changed.ok) return redirect(href("/deliveries/:deliveryId", { deliveryId: params.deliveryId }));
  if (changed.why === "missing") notHere();
  if (changed.why === "changed") return data({ result: submission.reply(), stale: changed }, { status: 409 });
  const fieldErrors = { supplierId: ["That supplier is not in this shop. Choose another, or name a new one."] };
  return data({ result: submission.reply({ fieldErrors }), stale: null }, { status: 400 });
}

export default function EditDelivery({ loaderData, actionData }: Route.ComponentProps) {
  const { delivery, suppliers } = loaderData;
  const shop = useShop();
  const schema = deliveryForm(shop);
  const sending = useNavigation().state !== "idle";
  const stale = actionData?.stale;
  const [form, fields] = useForm({
    id: "delivery",
    lastResult: actionData?.result,
    defaultValue: deliveryDefaults(delivery, shop.currency),
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  const at = { deliveryId: delivery.id };
  return (
    <>
      <PageHead title="Change the delivery" over={`${delivery.supplierName}, ${printDay(delivery.receivedOn)}`} />
      {delivery.talliedAt ? (
        <Notice className="mb-4">
          Its boards keep the species, quarters and grade they were tallied with; each is corrected on its own page.
        </Notice>
      ) : null}
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        {/* After a refusal the version is that of the record one was told about. */}
        <input type="hidden" name="version" value={stale?.version ?? delivery.version} />
        <DeliveryFields fields={fields} suppliers={suppliers} />
        {stale ? (
          <Notice kind="wrong" title="This delivery changed while you wrote">
            {stale.byName ?? "Somebody"} changed it{stale.at ? <> on {<When at={stale.at} />}</> : null}. What you typed
            is still here.{" "}
            <a
              href={href("/deliveries/:deliveryId", at)}
              target="_blank"
              rel="noreferrer"
              className="text-link underline"
            >
              Look at it as it is now
            </a>
            , then save again to put yours in its place.
          </Notice>
        ) : null}
        <div className="flex flex-wrap gap-3">
          <Button look="main" disabled={sending} className="w-full sm:w-auto">
            Save
          </Button>
          <ButtonLink to={href("/deliveries/:deliveryId", at)}>Leave it as it was</ButtonLink>
        </div>
      </Form>
    </>
  );
}
