import { getFormProps, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Notice } from "#app/components/notice.tsx";
import { Panel } from "#app/components/panel.tsx";
import { printDay } from "#app/components/when.tsx";
import {
  type CorrectionGroup,
  correctionGroups,
  correctionSchema,
} from "#app/domain/boards/board-correction.schema.ts";
import { correctBoard } from "#app/domain/boards/boards.server.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { CorrectionFields, correctionDefaults } from "#app/domain/boards/correction-fields.tsx";
import { useRecordAsOpened } from "#app/domain/boards/use-record-as-opened.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { formVersion, notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/correct.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

const titles: Record<CorrectionGroup, string> = {
  wood: "Correct the wood",
  size: "Correct the size",
  figure: "Correct figure and colour",
  log: "Correct the log",
  notes: "Write the notes",
  cost: "Correct the cost",
};

function requireGroup(name: string): CorrectionGroup {
  return correctionGroups.find((group) => group === name) ?? notHere();
}

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:correct");
  const group = requireGroup(params.group);
  return { group, board: requireFound(await getBoard(context.get(dbContext), actor, params.boardId)) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "board:correct");
  const group = requireGroup(params.group);
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: correctionSchema(group, shop) });
  if (submission.status !== "success") return data({ result: submission.reply(), stale: null }, { status: 400 });
  const version = formVersion(formData);
  const result = await correctBoard(context.get(dbContext), actor, params.boardId, version, submission.value);
  if (!result.ok && result.why === "missing") notHere();
  if (!result.ok && result.why === "too short") {
    const lengthMm = [`Held beyond that for ${result.projects.join(", ")}: let it go first.`];
    return data({ result: submission.reply({ fieldErrors: { lengthMm } }), stale: null }, { status: 409 });
  }
  if (!result.ok)
    return data({ result: submission.reply(), stale: { byName: result.byName, at: result.at } }, { status: 409 });
  return redirect(href("/boards/:boardId", { boardId: params.boardId }));
}

export default function CorrectBoard({ loaderData, actionData }: Route.ComponentProps) {
  return <Correction key={loaderData.group} {...{ loaderData, actionData }} />;
}

function Correction({ loaderData, actionData }: Pick<Route.ComponentProps, "loaderData" | "actionData">) {
  const { board, group } = loaderData;
  const shop = useShop();
  const defaults = correctionDefaults(group, board, shop);
  const [form, fields] = useForm<Record<string, string>>({
    id: `correct-${group}`,
    lastResult: actionData?.result,
    defaultValue: defaults,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: correctionSchema(group, shop) }) as never,
    shouldRevalidate: "onInput",
  });
  const stale = actionData?.stale;
  const version = useRecordAsOpened({ formId: form.id, version: board.version, defaults, stale });
  return (
    <Panel title={titles[group]} closeTo={href("/boards/:boardId", { boardId: board.id })}>
      {stale ? (
        <Notice kind="wrong" title="This board changed while you wrote" className="mb-4">
          {stale.byName ?? "Somebody"} changed it{stale.at ? ` on ${printDay(stale.at)}` : ""}. What you typed is still
          here, and the rest is as it is now: look at both, then save again.
        </Notice>
      ) : null}
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <input type="hidden" name="version" value={version} />
        <CorrectionFields group={group} fields={fields} />
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Save
        </Button>
      </Form>
    </Panel>
  );
}
