import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { listByIds } from "#app/domain/boards/boards.sql.server.ts";
import { acceptForm, readWeights } from "#app/domain/plans/plan.schema.ts";
import { PlanResult } from "#app/domain/plans/plan-result.tsx";
import { PlanWeightFields } from "#app/domain/plans/plan-weight-fields.tsx";
import { acceptPlan, makePlan } from "#app/domain/plans/plans.server.ts";
import { getProject } from "#app/domain/projects/projects.sql.server.ts";
import { dbContext, plannerContext } from "#app/server/context.server.ts";
import { requireForm, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/plan.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "project:change");
  const db = context.get(dbContext);
  const project = requireFound(await getProject(db, actor, params.projectId));
  const weights = readWeights(url.searchParams, shop.currency);
  const made = await makePlan({ db, planner: context.get(plannerContext) }, actor, shop, project.id, weights.read);
  return { project, made, weights: weights.typed };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "hold:place");
  const db = context.get(dbContext);
  const project = requireFound(await getProject(db, actor, params.projectId));
  const { stretches } = await requireForm(request, acceptForm);
  const now = systemClock.now();
  const hold = { note: "by plan", expiresAt: new Date(now.getTime() + shop.holdDays * 86_400_000) };
  const accepted = await acceptPlan(db, actor, project.id, stretches, hold, now);
  if (accepted.ok) return redirect(href("/projects/:projectId", { projectId: project.id }));
  const changed = await listByIds(
    db,
    actor,
    accepted.refused.map(({ boardId }) => boardId),
  );
  return data({ changed: changed.map((board) => board.tag) }, { status: 409 });
}

export default function PlanPage({ loaderData, actionData }: Route.ComponentProps) {
  const { project, made, weights } = loaderData;
  return (
    <>
      <PageHead
        title={`Plan ${project.name}`}
        lead="Which boards of this rack give its parts, and how each is cut. Nothing is held until you accept."
        actions={
          <ButtonLink to={href("/projects/:projectId", { projectId: project.id })}>Back to the project</ButtonLink>
        }
      />
      {actionData ? (
        <Notice kind="wrong" title="Nothing was reserved" className="mb-4">
          These boards changed meanwhile: {actionData.changed.join(", ")}. Here is a plan without them.
        </Notice>
      ) : null}
      <div className="grid items-start gap-4 lg:grid-cols-[18rem_minmax(0,1fr)]">
        <Card title="Weigh">
          <Form method="get" className="grid gap-4">
            <PlanWeightFields typed={weights} />
            <Button look="main">Plan again</Button>
          </Form>
        </Card>
        {made.ok ? <PlanResult plan={made.plan} /> : <Notice kind="caution" title={made.why} />}
      </div>
    </>
  );
}
