import { href, Link } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { ProjectMark } from "#app/components/crayon.tsx";
import { Empty } from "#app/components/notice.tsx";
import { printDay } from "#app/components/when.tsx";
import { listProjects } from "#app/domain/projects/projects.sql.server.ts";
import { can } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/list.ts";

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "project:see");
  const projects = await listProjects(context.get(dbContext), actor);
  return { projects, mayOpen: can(actor.role, "project:change") };
}

export default function Projects({ loaderData }: Route.ComponentProps) {
  const { projects, mayOpen } = loaderData;
  const open = mayOpen ? (
    <ButtonLink look="main" to={href("/projects/new")}>
      Open a project
    </ButtonLink>
  ) : null;
  return (
    <>
      <PageHead title="Projects" lead="What boards are spoken for, and by when." actions={open} />
      {projects.length === 0 ? (
        <Empty title="No projects yet" action={open}>
          A project is what a board is reserved for: a hall bench, a set of stools. Give it a crayon and its boards
          carry the mark.
        </Empty>
      ) : (
        <ul className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3">
          {projects.map((project) => (
            <li key={project.id}>
              <Card className="h-full">
                <Link
                  to={href("/projects/:projectId", { projectId: project.id })}
                  className="block text-ink no-underline hover:underline"
                >
                  <h2 className="text-xl">
                    <ProjectMark name={project.name} crayon={project.crayon} />
                  </h2>
                </Link>
                <p className="mt-1 text-ink-soft">
                  {[project.client, project.state, project.dueOn ? `due ${printDay(project.dueOn)}` : null]
                    .filter(Boolean)
                    .join(" · ")}
                </p>
                <p className="mt-3">
                  {project.boards === 0
                    ? "No boards reserved"
                    : `${project.boards} ${project.boards === 1 ? "board" : "boards"} reserved`}
                </p>
              </Card>
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
