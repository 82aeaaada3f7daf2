import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { isDuplicateKey } from "#app/services/db.server.ts";
import type { ProjectForm } from "./project.schema.ts";
import { insertProject, updateProject } from "./projects.sql.server.ts";

export type ProjectSaved = { ok: true; projectId: string } | { ok: false; why: "name taken" | "changed" };

/** Opens a project. Two projects of one shop cannot share a name: people say the name at the rack. */
export async function openProject(db: Knex, actor: Actor, form: ProjectForm): Promise<ProjectSaved> {
  return orNameTaken(async () => ({ ok: true, projectId: await insertProject(db, actor, form) }));
}

/** Changes a project, unless somebody else has since the form was opened. */
export async function changeProject(
  db: Knex,
  actor: Actor,
  projectId: string,
  version: number,
  form: ProjectForm,
): Promise<ProjectSaved> {
  return orNameTaken(async () =>
    (await updateProject(db, actor, projectId, version, form))
      ? { ok: true, projectId }
      : { ok: false, why: "changed" },
  );
}

async function orNameTaken(save: () => Promise<ProjectSaved>): Promise<ProjectSaved> {
  try {
    return await save();
  } catch (error) {
    if (isDuplicateKey(error, "projects_name")) return { ok: false, why: "name taken" };
    throw error;
  }
}
