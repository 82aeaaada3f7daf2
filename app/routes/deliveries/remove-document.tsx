import { Form, href, type RouterContextProvider, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { removeDocument } from "#app/domain/deliveries/documents.server.ts";
import { getDocument } from "#app/domain/deliveries/documents.sql.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/remove-document.ts";

/** The paper that the address names, of the delivery that it names. */
async function requireDocument(context: Readonly<RouterContextProvider>, params: Route.LoaderArgs["params"]) {
  const { actor } = requireRole(context, "delivery:receive");
  const document = await getDocument(context.get(dbContext), actor, params.documentId, "ready");
  if (document?.deliveryId !== params.deliveryId) notHere();
  return { actor, document };
}

export async function loader({ params, context }: Route.LoaderArgs) {
  const { id, name, deliveryId } = (await requireDocument(context, params)).document;
  return { id, name, deliveryId };
}

export async function action({ params, context }: Route.ActionArgs) {
  const { actor, document } = await requireDocument(context, params);
  const removed = await removeDocument(context.get(dbContext), context.get(storageContext), actor, document.id);
  return redirect(href("/deliveries/:deliveryId", requireFound(removed)));
}

export default function RemoveDocument({ loaderData }: Route.ComponentProps) {
  const { name, deliveryId } = loaderData;
  return (
    <>
      <PageHead title="Remove this document?" over={name} />
      <Card className="grid max-w-2xl gap-4">
        <p>The file itself goes and cannot be brought back. Keep the paper, or another copy, if it may be asked for.</p>
        <Form method="post" className="flex flex-wrap gap-3">
          <Button look="danger">Remove the document</Button>
          <ButtonLink to={href("/deliveries/:deliveryId", { deliveryId })}>Keep it</ButtonLink>
        </Form>
      </Card>
    </>
  );
}
