import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { projectForm } from "#app/domain/projects/project.schema.ts";
import { ProjectFields } from "#app/domain/projects/project-fields.tsx";
import { openProject } from "#app/domain/projects/projects.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/new.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "project:change");
  return {};
}

export async function action({ request, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "project:change");
  const submission = parseWithZod(await request.formData(), { schema: projectForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const saved = await openProject(context.get(dbContext), actor, submission.value);
  if (!saved.ok) {
    const fieldErrors = { name: ["The shop has a project of that name. Add a word to tell them apart."] };
    return data({ result: submission.reply({ fieldErrors }) }, { status: 409 });
  }
  return redirect(href("/projects/:projectId", { projectId: saved.projectId }));
}

export default function NewProject({ actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(projectForm),
    defaultValue: { crayon: "blue", state: "planned" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: projectForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <>
      <PageHead title="Open a project" lead="What will be made, for whom, and the crayon its boards carry." />
      <Card className="max-w-3xl">
        <Form method="post" {...getFormProps(form)} className="grid gap-5">
          <ProjectFields fields={fields} />
          <div className="flex flex-wrap gap-3">
            <Button look="main">Open project</Button>
            <ButtonLink to={href("/projects")} look="quiet">
              Back to projects
            </ButtonLink>
          </div>
        </Form>
      </Card>
    </>
  );
}
