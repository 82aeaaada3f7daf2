import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, Link, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Notice } from "#app/components/notice.tsx";
import { Panel } from "#app/components/panel.tsx";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { offcutForm } from "#app/domain/offcuts/offcut.ts";
import { listOffcuts, makeOffcut } from "#app/domain/offcuts/offcuts.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/offcut.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:correct");
  return { offcuts: await listOffcuts(context.get(dbContext), actor, params.boardId) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "board:correct");
  const submission = parseWithZod(await request.formData(), { schema: offcutForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const made = await makeOffcut(
    context.get(dbContext),
    actor,
    params.boardId,
    submission.value,
    shop.classLimits,
    systemClock.now(),
  );
  if (made.ok) return redirect(href("/boards/:boardId", { boardId: made.boardId }));
  if (made.why === "missing") notHere();
  const reply =
    made.why === "place"
      ? submission.reply({ fieldErrors: { [made.field]: [made.words] } })
      : submission.reply({ formErrors: ["Take the board down first: offcuts come back from the bench."] });
  return data({ result: reply }, { status: 409 });
}

export default function MakeOffcut({ params, loaderData, actionData }: Route.ComponentProps) {
  const { units } = useShop();
  const schema = offcutForm(units);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { alongMm: "0", acrossMm: "0" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="An offcut came back" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      {form.errors ? <Notice kind="wrong" title={form.errors.join(" ")} className="mb-4" /> : null}
      {loaderData.offcuts.length > 0 ? (
        <p className="mb-3">
          Already back:{" "}
          {loaderData.offcuts.map((offcut, index) => (
            <span key={offcut.id}>
              {index > 0 ? ", " : ""}
              <Link to={href("/boards/:boardId", { boardId: offcut.id })} className="text-link underline">
                {offcut.tag}
              </Link>{" "}
              (<LengthText mm={offcut.widthMm} unit={false} /> × <LengthText mm={offcut.lengthMm} />)
            </span>
          ))}
        </p>
      ) : null}
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField label="Length" unit={units} {...fieldProps(fields.lengthMm)} />
          <TextField label="Width" unit={units} {...fieldProps(fields.widthMm)} />
          <TextField label="It began, from the near end" unit={units} {...fieldProps(fields.alongMm)} />
          <TextField
            label="It began, from the left edge"
            unit={units}
            {...fieldProps(fields.acrossMm)}
            hint="Seen from the near end, heart face up."
          />
        </div>
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Give it a tag
        </Button>
      </Form>
    </Panel>
  );
}
