import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Panel } from "#app/components/panel.tsx";
import { isIdentifier } from "#app/core/identifiers/identifier.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { defectFaces, defectForm, defectKinds, offBoard } from "#app/domain/boards/defect.ts";
import { noteDefect, removeDefect } from "#app/domain/boards/defects.sql.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/defects.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "board:correct");
  return {};
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "board:correct");
  const db = context.get(dbContext);
  const formData = await request.formData();
  const remove = formData.get("remove");
  if (typeof remove === "string") {
    if (!isIdentifier(remove) || !(await removeDefect(db, actor, params.boardId, remove))) notHere();
    return redirect(href("/boards/:boardId", { boardId: params.boardId }));
  }
  const board = requireFound(await getBoard(db, actor, params.boardId));
  const submission = parseWithZod(formData, { schema: defectForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const off = offBoard(submission.value, board);
  if (off)
    return data(
      { result: submission.reply({ fieldErrors: { [off]: ["That is past the edge of the board."] } }) },
      { status: 400 },
    );
  await noteDefect(db, actor, board.id, submission.value);
  return redirect(href("/boards/:boardId", { boardId: board.id }));
}

export default function NoteDefect({ params, actionData }: Route.ComponentProps) {
  const { units } = useShop();
  const schema = defectForm(units);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { face: "both", acrossMm: "0" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="Note a defect" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-3">
          <SelectField label="What it is" {...fieldProps(fields.kind)}>
            {defectKinds.map((kind) => (
              <option key={kind}>{kind}</option>
            ))}
          </SelectField>
          <SelectField label="Face" {...fieldProps(fields.face)}>
            {defectFaces.map((face) => (
              <option key={face}>{face}</option>
            ))}
          </SelectField>
          <TextField label="Note" {...fieldProps(fields.note)} />
          <TextField label="Begins, from the near end" unit={units} {...fieldProps(fields.alongMm)} />
          <TextField
            label="Begins, from the left edge"
            unit={units}
            {...fieldProps(fields.acrossMm)}
            hint="Seen from the near end, heart face up."
          />
          <div className="grid grid-cols-2 gap-4">
            <TextField label="Long" unit={units} {...fieldProps(fields.lengthMm)} />
            <TextField label="Wide" unit={units} {...fieldProps(fields.widthMm)} />
          </div>
        </div>
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Note it
        </Button>
      </Form>
    </Panel>
  );
}
