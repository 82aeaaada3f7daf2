import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { useSyncExternalStore } from "react";
import { data, Form, href, redirect, useNavigation } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { PageHead } from "#app/components/card.tsx";
import { receiveDelivery } from "#app/domain/deliveries/deliveries.server.ts";
import { deliveryForm } from "#app/domain/deliveries/delivery.schema.ts";
import { DeliveryFields } from "#app/domain/deliveries/delivery-fields.tsx";
import { listSuppliers } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/new.ts";

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:receive");
  const suppliers = await listSuppliers(context.get(dbContext), actor);
  return { suppliers: suppliers.map(({ id, name }) => ({ id, name })), today: dayOf(systemClock.now()) };
}

/** A day in UTC. */
function dayOf(moment: Date): string {
  return moment.toISOString().slice(0, 10);
}

function dayHere(): string {
  const now = new Date();
  return dayOf(new Date(now.getTime() - now.getTimezoneOffset() * 60_000));
}

const neverChanges = () => () => {};

export async function action({ request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "delivery:receive");
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: deliveryForm(shop) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const received = await receiveDelivery(context.get(dbContext), actor, submission.value);
  if (!received.ok) {
    const fieldErrors = { supplierId: ["That supplier is not in this shop. Choose another, or name a new one."] };
    return data({ result: submission.reply({ fieldErrors }) }, { status: 400 });
  }
  const at = { deliveryId: received.deliveryId };
  return redirect(
    formData.get("then") === "look" ? href("/deliveries/:deliveryId", at) : href("/deliveries/:deliveryId/tally", at),
  );
}

export default function NewDelivery(props: Route.ComponentProps) {
  // The server's day is that of Greenwich; this device knows what day it is where the lorry stands.
  const receivedOn = useSyncExternalStore(neverChanges, dayHere, () => props.loaderData.today);
  return (
    <>
      <PageHead title="Log a delivery" lead="What the supplier's papers say. Measuring comes next, board by board." />
      <NewDeliveryForm key={receivedOn} receivedOn={receivedOn} {...props} />
    </>
  );
}

function NewDeliveryForm({ loaderData, actionData, receivedOn }: Route.ComponentProps & { receivedOn: string }) {
  const { suppliers } = loaderData;
  const shop = useShop();
  const schema = deliveryForm(shop);
  const sending = useNavigation().state !== "idle";
  const [form, fields] = useForm({
    id: "delivery",
    lastResult: actionData?.result,
    defaultValue: { receivedOn, quarters: "4", drying: "kiln", claimedUnit: "bf", priceBasis: "bf" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-4">
      <DeliveryFields fields={fields} suppliers={suppliers} />
      <div className="flex flex-wrap gap-3">
        <Button look="main" disabled={sending} className="w-full sm:w-auto">
          Log it and tally
        </Button>
        <Button name="then" value="look" disabled={sending} className="w-full sm:w-auto">
          Log it, tally later
        </Button>
        <ButtonLink to={href("/deliveries")} look="quiet">
          Back to deliveries
        </ButtonLink>
      </div>
    </Form>
  );
}
