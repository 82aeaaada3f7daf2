import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { printDay } from "#app/components/when.tsx";
import { deleteDelivery } from "#app/domain/deliveries/deliveries.server.ts";
import { getDelivery } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/delete.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:delete");
  return { delivery: requireFound(await getDelivery(context.get(dbContext), actor, params.deliveryId)) };
}

export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "delivery:delete");
  const result = await deleteDelivery(context.get(dbContext), actor, params.deliveryId, systemClock.now());
  if (result.ok) return redirect(href("/deliveries"));
  if (result.why === "missing") notHere();
  return data({ why: result.why }, { status: 409 });
}

export default function DeleteDelivery({ loaderData, actionData }: Route.ComponentProps) {
  const { delivery } = loaderData;
  return (
    <>
      <PageHead title="Delete this delivery?" over={`${delivery.supplierName}, ${printDay(delivery.receivedOn)}`} />
      <Card className="grid max-w-2xl gap-4">
        <p>
          It leaves the list, with its documents and whatever was typed of its tally. For one that was logged by
          mistake; once tallied, a delivery stays, as its boards say where they came from.
        </p>
        {actionData || delivery.talliedAt ? (
          <Notice kind="wrong" title="It is tallied">
            Its boards are on the rack’s record. Delete the boards that are not there, and correct the papers.
          </Notice>
        ) : null}
        <Form method="post" className="flex flex-wrap gap-3">
          {delivery.talliedAt ? null : <Button look="danger">Delete this delivery</Button>}
          <ButtonLink to={href("/deliveries/:deliveryId", { deliveryId: delivery.id })}>Keep it</ButtonLink>
        </Form>
      </Card>
    </>
  );
}
