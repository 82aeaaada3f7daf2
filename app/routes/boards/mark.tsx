import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button } from "#app/components/button.tsx";
import { Notice } from "#app/components/notice.tsx";
import { Panel } from "#app/components/panel.tsx";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { type MarkableState, markableStates, markBoard } from "#app/domain/holds/mark-board.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireForm, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/mark.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

const form = z.object({ to: z.enum(markableStates) });

const words: Record<MarkableState, string> = {
  used: "Used up",
  sold: "Sold",
  lost: "Not found",
  racked: "Back on the rack",
};

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:correct");
  const { state } = requireFound(await getBoard(context.get(dbContext), actor, params.boardId));
  const gone = state === "used" || state === "sold" || state === "lost";
  return { choices: markableStates.filter((to) => gone === (to === "racked")) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "board:correct");
  const { to } = await requireForm(request, form);
  const marked = await markBoard(context.get(dbContext), actor, params.boardId, to, systemClock.now());
  if (!marked.ok && marked.why === "missing") notHere();
  if (marked.ok) return redirect(href("/boards/:boardId", { boardId: params.boardId }));
  const why =
    marked.why === "held"
      ? "It is spoken for: let its holds go first."
      : `It is ${"state" in marked ? marked.state : "changed"} by now.`;
  return data({ why }, { status: 409 });
}

export default function MarkBoard({ params, loaderData, actionData }: Route.ComponentProps) {
  return (
    <Panel title="What became of it" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      {actionData ? <Notice kind="wrong" title={actionData.why} className="mb-4" /> : null}
      <Form method="post" className="flex flex-wrap gap-2">
        {loaderData.choices.map((to) => (
          <Button key={to} name="to" value={to}>
            {words[to]}
          </Button>
        ))}
      </Form>
      <p className="mt-3 text-ink-soft">
        Used, sold and lost boards leave the rack and stay in the list under their state. It can be marked back.
      </p>
    </Panel>
  );
}
