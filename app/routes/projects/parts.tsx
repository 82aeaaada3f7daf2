import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Panel } from "#app/components/panel.tsx";
import { isIdentifier } from "#app/core/identifiers/identifier.ts";
import { partForm } from "#app/domain/projects/project.schema.ts";
import { deletePart, getProject, insertPart } from "#app/domain/projects/projects.sql.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { SpeciesOptions } from "#app/domain/species/species-options.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/parts.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "project:change");
  return {};
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "project:change");
  const db = context.get(dbContext);
  const { projectId } = params;
  requireFound(await getProject(db, actor, projectId));
  const formData = await request.formData();
  const remove = formData.get("remove");
  if (typeof remove === "string") {
    if (!isIdentifier(remove) || !(await deletePart(db, actor, projectId, remove))) notHere();
    return redirect(href("/projects/:projectId", { projectId }));
  }
  const submission = parseWithZod(formData, { schema: partForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  await insertPart(db, actor, projectId, submission.value);
  return redirect(href("/projects/:projectId", { projectId }));
}

export default function AddPart({ params, actionData }: Route.ComponentProps) {
  const { units } = useShop();
  const schema = partForm(units);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { quantity: "1", ringMinDeg: "0", ringMaxDeg: "90", species: "white-oak" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="Add a part" closeTo={href("/projects/:projectId", { projectId: params.projectId })}>
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-3">
          <TextField label="Name" autoFocus {...fieldProps(fields.name)} hint="Front leg." />
          <TextField label="How many" type="number" min={1} {...fieldProps(fields.quantity)} />
          <SelectField label="Species" {...fieldProps(fields.species)}>
            <SpeciesOptions />
          </SelectField>
          <TextField label="Finished thickness" unit={units} {...fieldProps(fields.thicknessMm)} />
          <TextField label="Finished width" unit={units} {...fieldProps(fields.widthMm)} />
          <TextField label="Finished length" unit={units} {...fieldProps(fields.lengthMm)} />
          <TextField
            label="Rings, least angle to the face"
            unit="°"
            inputMode="decimal"
            {...fieldProps(fields.ringMinDeg)}
          />
          <TextField
            label="Rings, greatest angle"
            unit="°"
            inputMode="decimal"
            {...fieldProps(fields.ringMaxDeg)}
            hint="A leg asks for rift: 30 to 60."
          />
        </div>
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Add it
        </Button>
      </Form>
    </Panel>
  );
}
