import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Empty } from "#app/components/notice.tsx";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { BoardLength } from "#app/domain/boards/board-length.tsx";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { endOfHold, holdForm, stretchOf } from "#app/domain/holds/hold.schema.ts";
import { freeStretches } from "#app/domain/holds/hold.ts";
import { HoldRefused } from "#app/domain/holds/hold-refused.tsx";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import { PartChoice } from "#app/domain/holds/part-choice.tsx";
import { listOpenProjects } from "#app/domain/projects/projects.sql.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/reserve.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "hold:place");
  const db = context.get(dbContext);
  const [board, projects] = await Promise.all([getBoard(db, actor, params.boardId), listOpenProjects(db, actor)]);
  const until = new Date(systemClock.now().getTime() + shop.holdDays * 86_400_000).toISOString().slice(0, 10);
  return { board: requireFound(board), projects, until, projectId: url.searchParams.get("project") ?? "" };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "hold:place");
  const db = context.get(dbContext);
  const board = requireFound(await getBoard(db, actor, params.boardId));
  const submission = parseWithZod(await request.formData(), { schema: holdForm(shop.units) });
  if (submission.status !== "success") return data({ result: submission.reply(), refusal: null }, { status: 400 });
  const now = systemClock.now();
  const end = endOfHold(submission.value.until, now);
  if (!end.ok)
    return data({ result: submission.reply({ fieldErrors: { until: [end.why] } }), refusal: null }, { status: 400 });
  const { projectId, note } = submission.value;
  const stretch = stretchOf(submission.value, board.lengthMm);
  const placed = await placeHold(db, actor, { boardId: board.id, projectId, note, ...stretch, expiresAt: end.at }, now);
  if (!placed.ok && placed.why === "missing") notHere();
  if (!placed.ok)
    return data({ result: submission.reply(), refusal: placed, refusedAt: now.getTime() }, { status: 409 });
  return redirect(href("/boards/:boardId", { boardId: board.id }));
}

export default function Reserve({ loaderData, actionData }: Route.ComponentProps) {
  const { board, projects, until, projectId } = loaderData;
  const { units } = useShop();
  const schema = holdForm(units);
  const free = freeStretches(board.lengthMm, board.holds);
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(schema),
    defaultValue: { projectId, part: firstChoice(free, board.lengthMm), until },
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: "onInput",
  });
  return (
    <>
      <PageHead title={`Reserve ${board.tag}`} over={board.place ?? "No place recorded"} />
      <div className="grid max-w-3xl gap-4">
        <BoardEnd board={board} heightPx={56} />
        <BoardLength board={board} />
        {actionData?.refusal ? <HoldRefused key={actionData.refusedAt} refusal={actionData.refusal} /> : null}
        {projects.length === 0 ? (
          <Empty
            title="No project to reserve it for"
            action={
              <ButtonLink look="main" to={href("/projects/new")}>
                Open a project
              </ButtonLink>
            }
          >
            A board is spoken for by a project, so that everybody at the rack knows what it is for.
          </Empty>
        ) : (
          <Card>
            <Form method="post" {...getFormProps(form)} className="grid gap-5">
              <SelectField label="For which project" {...fieldProps(fields.projectId)}>
                <option value="">Choose a project</option>
                {projects.map((project) => (
                  <option key={project.id} value={project.id}>
                    {project.name}
                  </option>
                ))}
              </SelectField>
              <PartChoice part={fields.part} length={fields.lengthMm} board={board} free={free} />
              <div className="grid gap-4 sm:grid-cols-2">
                <TextField label="Until the end of" type="date" {...fieldProps(fields.until)} />
                <TextField label="Note" {...fieldProps(fields.note)} hint="What it is for: back rails." />
              </div>
              <Button look="main" className="w-full sm:w-auto">
                Reserve
              </Button>
            </Form>
          </Card>
        )}
        <ButtonLink look="quiet" to={href("/boards/:boardId", { boardId: board.id })} className="justify-self-start">
          Back to {board.tag}
        </ButtonLink>
      </div>
    </>
  );
}

/** The choice that can succeed: the whole board when it is free, else the end with the longer free rest. */
function firstChoice(free: { fromMm: number; toMm: number }[], lengthMm: number): "whole" | "near" | "far" {
  const near = free.find((stretch) => stretch.fromMm === 0);
  const far = free.find((stretch) => stretch.toMm === lengthMm);
  if (near && near === far) return "whole";
  const length = (stretch: typeof near) => (stretch ? stretch.toMm - stretch.fromMm : 0);
  return length(far) >= length(near) ? "far" : "near";
}
