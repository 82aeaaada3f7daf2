import { Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { SelectField } from "#app/components/field.tsx";
import { Panel } from "#app/components/panel.tsx";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { moveBoard } from "#app/domain/boards/boards.server.ts";
import { listBays } from "#app/domain/rack/rack.sql.server.ts";
import { armName } from "#app/domain/rack/rack.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/move.ts";

const form = z.object({ armId: z.string().regex(identifier).or(z.literal("")).default("") });

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "board:move");
  return { bays: await listBays(context.get(dbContext), actor) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "board:move");
  const asked = form.safeParse(Object.fromEntries(await request.formData()));
  if (!asked.success) notHere();
  const moved = await moveBoard(context.get(dbContext), actor, params.boardId, asked.data.armId || null);
  if (!moved.ok) notHere();
  return redirect(href("/boards/:boardId", { boardId: params.boardId }));
}

export default function MoveBoard({ params, loaderData }: Route.ComponentProps) {
  const { bays } = loaderData;
  return (
    <Panel title="Move it to" closeTo={href("/boards/:boardId", { boardId: params.boardId })}>
      {bays.length === 0 ? (
        <p>
          The shop has no bays recorded yet. <ButtonLink to={href("/rack/bays/new")}>Add a bay</ButtonLink>
        </p>
      ) : (
        <Form method="post" className="grid gap-4 sm:flex sm:items-end">
          <SelectField label="Arm" name="armId" autoFocus hint="It lies on top of what is there.">
            {bays.map((bay) => (
              <optgroup key={bay.id} label={`Bay ${bay.name}`}>
                {bay.arms.map((arm) => (
                  <option key={arm.id} value={arm.id}>
                    {armName(bay, arm)}
                  </option>
                ))}
              </optgroup>
            ))}
            <option value="">No place on the rack</option>
          </SelectField>
          <Button look="main">Move</Button>
        </Form>
      )}
    </Panel>
  );
}
