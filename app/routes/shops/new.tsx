import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { FrontDoor } from "#app/components/front-door.tsx";
import { Notice } from "#app/components/notice.tsx";
import { newShopForm } from "#app/domain/people/people.schema.ts";
import { openShop } from "#app/domain/people/people.server.ts";
import { renamePerson } from "#app/domain/people/people.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireVisit } from "#app/server/guards.server.ts";
import { chooseShop } from "#app/server/session.server.ts";
import { mayOpenShop } from "#app/server/sign-in/limits.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/new.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return { personName: requireVisit(context, url).personName };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const visit = requireVisit(context, url);
  const db = context.get(dbContext);
  const submission = parseWithZod(await request.formData(), { schema: newShopForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  if (!(await mayOpenShop(db, visit.personId, systemClock.now()))) {
    const formErrors = ["That is enough new shops for one day."];
    return data({ result: submission.reply({ formErrors }) }, { status: 429 });
  }
  const { personName, ...shop } = submission.value;
  await renamePerson(db, visit.personId, personName);
  await chooseShop(db, visit, await openShop(db, visit.personId, shop));
  return redirect(href("/rack"));
}

export default function NewShop({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(newShopForm),
    defaultValue: { personName: loaderData.personName, units: "in", currency: "USD" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: newShopForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <FrontDoor
      title="Open a shop"
      lead="You will own it; others come in by invitation. All of this can be changed later."
    >
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <TextField label="What people call you" autoComplete="name" {...fieldProps(fields.personName)} />
        <TextField label="Name of the shop" {...fieldProps(fields.name)} />
        <div className="grid gap-4 sm:grid-cols-2">
          <SelectField label="Sizes in" {...fieldProps(fields.units)}>
            <option value="in">inches and fractions</option>
            <option value="mm">millimetres</option>
          </SelectField>
          <TextField label="Money in" {...fieldProps(fields.currency)} hint="USD, EUR, GBP." />
        </div>
        {form.errors ? <Notice kind="wrong" title={form.errors.join(" ")} /> : null}
        <Button look="main" className="min-h-14 text-lg">
          Open the shop
        </Button>
      </Form>
    </FrontDoor>
  );
}
