import { parseWithZod } from "@conform-to/zod/v4";
import { data, href, redirect } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { When } from "#app/components/when.tsx";
import { supplierForm } from "#app/domain/deliveries/supplier.schema.ts";
import { SupplierFields } from "#app/domain/deliveries/supplier-form.tsx";
import { changeSupplier } from "#app/domain/deliveries/suppliers.server.ts";
import { getSupplier } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { formVersion, notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/supplier.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "supplier:change");
  return { supplier: requireFound(await getSupplier(context.get(dbContext), actor, params.supplierId)) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "supplier:change");
  const db = context.get(dbContext);
  requireFound(await getSupplier(db, actor, params.supplierId));
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: supplierForm });
  if (submission.status !== "success") return data({ result: submission.reply(), stale: null }, { status: 400 });
  const version = formVersion(formData);
  const saved = await changeSupplier(db, actor, params.supplierId, version, submission.value, systemClock.now());
  if (saved.ok) return redirect(href("/suppliers"));
  if (saved.why === "missing") notHere();
  if (saved.why === "changed") return data({ result: submission.reply(), stale: saved }, { status: 409 });
  const fieldErrors = { name: ["The shop has another supplier of that name."] };
  return data({ result: submission.reply({ fieldErrors }), stale: null }, { status: 409 });
}

export default function SupplierPage({ loaderData, actionData }: Route.ComponentProps) {
  const { supplier } = loaderData;
  const stale = actionData?.stale;
  return (
    <>
      <PageHead
        title={supplier.name}
        over="Supplier"
        actions={
          <ButtonLink to={`${href("/deliveries")}?${new URLSearchParams({ supplier: supplier.id })}`}>
            Its deliveries
          </ButtonLink>
        }
      />
      {stale ? (
        <Notice kind="wrong" title="This supplier changed while you wrote" className="mb-4 max-w-3xl">
          {stale.byName ?? "Somebody"} changed it{stale.at ? <> on {<When at={stale.at} />}</> : null}. What you typed
          is still here; save again to put it in place of theirs.
        </Notice>
      ) : null}
      <Card className="max-w-3xl">
        <SupplierFields
          result={actionData?.result}
          supplier={supplier}
          version={stale?.version ?? supplier.version}
          save="Save"
        >
          <ButtonLink to={href("/suppliers")} look="quiet">
            Back to suppliers
          </ButtonLink>
        </SupplierFields>
      </Card>
    </>
  );
}
