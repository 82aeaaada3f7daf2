import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { deleteBoard } from "#app/domain/boards/boards.server.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { BoardSize } from "#app/domain/boards/size-text.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/delete.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:delete");
  return { board: requireFound(await getBoard(context.get(dbContext), actor, params.boardId)) };
}

export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "board:delete");
  const result = await deleteBoard(context.get(dbContext), actor, params.boardId);
  if (!result.ok && result.why === "missing") notHere();
  if (!result.ok) return data({ projects: result.projects }, { status: 409 });
  return redirect(href("/boards"));
}

export default function DeleteBoard({ loaderData, actionData }: Route.ComponentProps) {
  const { board } = loaderData;
  return (
    <>
      <PageHead title={`Delete ${board.tag}?`} over={board.place} />
      <Card className="grid max-w-2xl gap-4">
        <BoardEnd board={board} heightPx={48} />
        <p>
          <BoardSize board={board} />. It leaves every list, and its tag opens nothing any more. Its history is kept. A
          board that was used, sold or lost is better marked so than deleted.
        </p>
        {actionData ? (
          <Notice kind="wrong" title="It is spoken for">
            Let go of its holds first: {actionData.projects.join(", ")}.
          </Notice>
        ) : null}
        <Form method="post" className="flex flex-wrap gap-3">
          <Button look="danger">Delete this board</Button>
          <ButtonLink to={href("/boards/:boardId", { boardId: board.id })}>Keep it</ButtonLink>
        </Form>
      </Card>
    </>
  );
}
