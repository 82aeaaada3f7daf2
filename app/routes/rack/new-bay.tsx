import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import { addBay } from "#app/domain/rack/rack.sql.server.ts";
import { lengthField } from "#app/domain/shop/length-field.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/new-bay.ts";

const kgPerLb = 0.453_592_37;

function bayForm(unit: LengthUnit) {
  return z.object({
    name: z.string({ error: "Name the bay: A." }).trim().min(1, "Name the bay: A.").max(40, "At most 40 characters."),
    note: z.string().trim().max(120, "At most 120 characters.").default(""),
    arms: z.coerce
      .number({ error: "How many arms?" })
      .int("A whole number.")
      .min(1, "At least one.")
      .max(20, "At most 20."),
    armWidthMm: lengthField(unit, { name: "reach of an arm", leastMm: 100, mostMm: 3_000 }),
    capacity: z.coerce
      .number({ error: "A number." })
      .positive("More than nothing.")
      .max(20_000, "That cannot be.")
      .nullable()
      .default(null),
  });
}

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "rack:change");
  return {};
}

export async function action({ request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "rack:change");
  const submission = parseWithZod(await request.formData(), { schema: bayForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const { capacity, ...bay } = submission.value;
  const capacityKg = capacity === null ? null : shop.units === "in" ? capacity * kgPerLb : capacity;
  if (!(await addBay(context.get(dbContext), actor, { ...bay, capacityKg }))) {
    const fieldErrors = { name: ["The rack has a bay of that name."] };
    return data({ result: submission.reply({ fieldErrors }) }, { status: 409 });
  }
  return redirect(href("/rack"));
}

export default function NewBay({ actionData }: Route.ComponentProps) {
  const { units } = useShop();
  const schema = bayForm(units);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { arms: "4", armWidthMm: units === "in" ? "24" : "600" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <>
      <PageHead title="Add a bay" lead="One upright of the rack with its arms, as one stands before it." />
      <Card className="max-w-2xl">
        <Form method="post" {...getFormProps(form)} className="grid gap-4 sm:grid-cols-2">
          <TextField label="Name" {...fieldProps(fields.name)} hint="A, or Window." />
          <TextField label="What lies there" {...fieldProps(fields.note)} hint="White oak, ash." />
          <TextField label="Arms" type="number" min={1} max={20} {...fieldProps(fields.arms)} />
          <TextField label="Reach of an arm" unit={units} {...fieldProps(fields.armWidthMm)} />
          <TextField
            label="Rated load of a level"
            unit={units === "in" ? "lb" : "kg"}
            inputMode="decimal"
            {...fieldProps(fields.capacity)}
            hint="From the rack maker's plate, for all the arms that bear one board together. Leave it empty if you do not know."
            className="sm:col-span-2"
          />
          <div className="flex gap-3 sm:col-span-2">
            <Button look="main">Add the bay</Button>
            <ButtonLink look="quiet" to={href("/rack")}>
              Back to the rack
            </ButtonLink>
          </div>
        </Form>
      </Card>
    </>
  );
}
