import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Notice } from "#app/components/notice.tsx";
import { Panel } from "#app/components/panel.tsx";
import { projectForm } from "#app/domain/projects/project.schema.ts";
import { ProjectFields } from "#app/domain/projects/project-fields.tsx";
import { changeProject } from "#app/domain/projects/projects.server.ts";
import { getProject } from "#app/domain/projects/projects.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { formVersion, requireFound, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/change.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "project:change");
  return { project: requireFound(await getProject(context.get(dbContext), actor, params.projectId)) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "project:change");
  const db = context.get(dbContext);
  requireFound(await getProject(db, actor, params.projectId));
  const formData = await request.formData();
  const submission = parseWithZod(formData, { schema: projectForm });
  if (submission.status !== "success") return data({ result: submission.reply(), stale: false }, { status: 400 });
  const saved = await changeProject(db, actor, params.projectId, formVersion(formData), submission.value);
  if (saved.ok) return redirect(href("/projects/:projectId", { projectId: params.projectId }));
  const fieldErrors = saved.why === "name taken" ? { name: ["The shop has a project of that name."] } : undefined;
  return data({ result: submission.reply({ fieldErrors }), stale: saved.why === "changed" }, { status: 409 });
}

export default function ChangeProject({ loaderData, actionData }: Route.ComponentProps) {
  const { project } = loaderData;
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(projectForm),
    defaultValue: { ...project, dueOn: project.dueOn ?? "" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: projectForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <Panel title="Change the project" closeTo={href("/projects/:projectId", { projectId: project.id })}>
      {actionData?.stale ? (
        <Notice kind="wrong" title="Somebody changed this project while you wrote" className="mb-4">
          What you typed is still here: compare it with the page below, then save again.
        </Notice>
      ) : null}
      <Form method="post" {...getFormProps(form)} className="grid gap-5">
        <input type="hidden" name="version" value={project.version} />
        <ProjectFields fields={fields} />
        <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
          Save
        </Button>
      </Form>
    </Panel>
  );
}
