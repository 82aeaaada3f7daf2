import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Panel } from "#app/components/panel.tsx";
import { correctedReading } from "#app/domain/moisture/corrected-reading.ts";
import { CorrectionPreview } from "#app/domain/moisture/correction-preview.tsx";
import { moistureForm } from "#app/domain/moisture/moisture.schema.ts";
import { keepMoistureReading } from "#app/domain/moisture/moisture.sql.server.ts";
import { temperatureUnit } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/moisture.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "moisture:read");
  return {};
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "moisture:read");
  const submission = parseWithZod(await request.formData(), { schema: moistureForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const { moisturePct } = correctedReading(submission.value);
  const reading = { ...submission.value, moisturePct };
  const kept = await keepMoistureReading(context.get(dbContext), actor, params.boardId, reading, systemClock.now());
  if (!kept) notHere();
  return redirect(href("/boards/:boardId", { boardId: params.boardId }));
}

export default function TakeReading({ params, actionData }: Route.ComponentProps) {
  const { units } = useShop();
  const schema = moistureForm(units);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { meter: "pin" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="Moisture reading" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <div className="grid grid-cols-2 gap-4 lg:grid-cols-4">
          <TextField label="Meter says" unit="%" inputMode="decimal" autoFocus {...fieldProps(fields.meterPct)} />
          <SelectField label="Meter" {...fieldProps(fields.meter)}>
            <option value="pin">pins</option>
            <option value="pinless">pinless</option>
            <option value="oven">oven-dry sample</option>
          </SelectField>
          <TextField
            label="Wood's temperature"
            unit={temperatureUnit(units)}
            inputMode="decimal"
            hint="Of the wood, not the air. Empty: not taken."
            {...fieldProps(fields.woodTemperatureC)}
          />
          <TextField label="Where on the board" {...fieldProps(fields.place)} hint="Middle of the heart face." />
        </div>
        <CorrectionPreview
          typed={{
            meterPct: String(fields.meterPct.value ?? ""),
            meter: String(fields.meter.value ?? ""),
            woodTemperatureC: String(fields.woodTemperatureC.value ?? ""),
          }}
        />
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Keep the reading
        </Button>
      </Form>
    </Panel>
  );
}
