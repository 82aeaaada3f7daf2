import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Panel } from "#app/components/panel.tsx";
import { moistureForm } from "#app/domain/moisture/moisture.schema.ts";
import { keepMoistureReading } from "#app/domain/moisture/moisture.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/moisture.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "moisture:read");
  return {};
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "moisture:read");
  const submission = parseWithZod(await request.formData(), { schema: moistureForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const reading = { ...submission.value, moisturePct: submission.value.meterPct };
  const kept = await keepMoistureReading(context.get(dbContext), actor, params.boardId, reading, systemClock.now());
  if (!kept) notHere();
  return redirect(href("/boards/:boardId", { boardId: params.boardId }));
}

export default function TakeReading({ params, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(moistureForm),
    defaultValue: { meter: "pin" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: moistureForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="Moisture reading" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-3">
          <TextField label="Meter says" unit="%" inputMode="decimal" autoFocus {...fieldProps(fields.meterPct)} />
          <SelectField label="Meter" {...fieldProps(fields.meter)}>
            <option value="pin">pins</option>
            <option value="pinless">pinless</option>
            <option value="oven">oven-dry sample</option>
          </SelectField>
          <TextField label="Where on the board" {...fieldProps(fields.place)} hint="Middle of the heart face." />
        </div>
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Keep the reading
        </Button>
      </Form>
    </Panel>
  );
}
