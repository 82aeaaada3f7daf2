import { parseWithZod } from "@conform-to/zod/v4";
import { data, href, redirect } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { supplierForm } from "#app/domain/deliveries/supplier.schema.ts";
import { SupplierFields } from "#app/domain/deliveries/supplier-form.tsx";
import { addSupplier } from "#app/domain/deliveries/suppliers.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/new.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "supplier:change");
  return null;
}

export async function action({ request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "supplier:change");
  const submission = parseWithZod(await request.formData(), { schema: supplierForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const saved = await addSupplier(context.get(dbContext), actor, submission.value);
  if (saved.ok) return redirect(href("/suppliers"));
  const fieldErrors = { name: ["The shop has a supplier of that name."] };
  return data({ result: submission.reply({ fieldErrors }) }, { status: 409 });
}

export default function NewSupplier({ actionData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Add a supplier" />
      <Card className="max-w-3xl">
        <SupplierFields result={actionData?.result} save="Add it">
          <ButtonLink to={href("/suppliers")} look="quiet">
            Back to suppliers
          </ButtonLink>
        </SupplierFields>
      </Card>
    </>
  );
}
