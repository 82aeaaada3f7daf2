import type { Knex } from "knex";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import type { PartForm, ProjectForm } from "./project.schema.ts";
import type { Part, Project, ProjectSummary } from "./project.ts";

type ByShop = Pick<Actor, "shopId">;

const projectColumns = {
  id: "p.id",
  name: "p.name",
  client: "p.client",
  dueOn: "p.due_on",
  crayon: "p.crayon",
  state: "p.state",
  notes: "p.notes",
  version: "p.version",
} as const;

const partColumns = {
  id: "id",
  name: "name",
  quantity: "quantity",
  thicknessMm: "thickness_mm",
  widthMm: "width_mm",
  lengthMm: "length_mm",
  species: "species",
  ringMinDeg: "ring_min_deg",
  ringMaxDeg: "ring_max_deg",
  version: "version",
} as const;

function projectsOf(db: Knex, actor: ByShop): Knex.QueryBuilder {
  return db("projects as p").where("p.shop_id", actor.shopId);
}

/** A project's name, or null when it is not in this shop. */
export async function projectName(db: Knex, actor: ByShop, projectId: string): Promise<string | null> {
  const row = await projectsOf(db, actor).where("p.id", projectId).first("p.name");
  return row?.name ?? null;
}

/** One project, or null. */
export async function getProject(db: Knex, actor: ByShop, projectId: string): Promise<Project | null> {
  return (await projectsOf(db, actor).where("p.id", projectId).first(projectColumns)) ?? null;
}

/** Projects that boards can be reserved for: not done, not dropped; by name. */
export async function listOpenProjects(db: Knex, actor: ByShop): Promise<Pick<Project, "id" | "name" | "crayon">[]> {
  return projectsOf(db, actor)
    .whereIn("p.state", ["planned", "underway"])
    .orderBy("p.name")
    .select("p.id", "p.name", "p.crayon");
}

/** All projects, those at work first, then by due date; each with how much is held for it. */
export async function listProjects(db: Knex, actor: ByShop): Promise<ProjectSummary[]> {
  const held = db("holds as h")
    .where("h.shop_id", actor.shopId)
    .whereIn("h.state", ["held", "out"])
    .whereRaw("(h.state = 'out' OR h.expires_at > NOW(3))")
    .groupBy("h.project_id")
    .select(
      "h.project_id",
      db.raw("COUNT(DISTINCT h.board_id) AS boards"),
      db.raw("SUM(h.to_mm - h.from_mm) AS held_mm"),
    );
  return projectsOf(db, actor)
    .leftJoin(held.as("held"), "held.project_id", "p.id")
    .orderByRaw("FIELD(p.state, 'underway', 'planned', 'done', 'dropped'), p.due_on IS NULL, p.due_on, p.name")
    .select({
      ...projectColumns,
      boards: db.raw("COALESCE(held.boards, 0)"),
      heldMm: db.raw("COALESCE(held.held_mm, 0)"),
    });
}

function projectRow(form: ProjectForm) {
  return {
    name: form.name,
    client: form.client,
    due_on: form.dueOn,
    crayon: form.crayon,
    state: form.state,
    notes: form.notes,
  };
}

/** @throws the duplicate-key error of projects_name when the shop has a project of that name. */
export async function insertProject(db: Knex, actor: Actor, form: ProjectForm): Promise<string> {
  const id = newId();
  await db("projects").insert({ id, shop_id: actor.shopId, created_by: actor.personId, ...projectRow(form) });
  return id;
}

/** Saves a project made from the given version; false when it has changed since. @throws duplicate key projects_name. */
export async function updateProject(
  db: Knex,
  actor: ByShop,
  projectId: string,
  version: number,
  form: ProjectForm,
): Promise<boolean> {
  const changed = await db("projects")
    .where({ id: projectId, shop_id: actor.shopId, version })
    .update({ ...projectRow(form), version: version + 1 });
  return changed === 1;
}

/** A project's parts in their order. */
export async function listParts(db: Knex, actor: ByShop, projectId: string): Promise<Part[]> {
  return db("parts")
    .where({ shop_id: actor.shopId, project_id: projectId })
    .orderBy(["sort", "name"])
    .select(partColumns);
}

/** Adds a part at the end of a project's list. */
export async function insertPart(db: Knex, actor: ByShop, projectId: string, form: PartForm): Promise<void> {
  const last = await db("parts").where({ shop_id: actor.shopId, project_id: projectId }).max({ sort: "sort" }).first();
  await db("parts").insert({
    id: newId(),
    shop_id: actor.shopId,
    project_id: projectId,
    sort: Number(last?.sort ?? -1) + 1,
    name: form.name,
    quantity: form.quantity,
    thickness_mm: form.thicknessMm,
    width_mm: form.widthMm,
    length_mm: form.lengthMm,
    species: form.species,
    ring_min_deg: form.ringMinDeg,
    ring_max_deg: form.ringMaxDeg,
  });
}

/** Removes a part; false when it is not this project's. */
export async function deletePart(db: Knex, actor: ByShop, projectId: string, partId: string): Promise<boolean> {
  return (await db("parts").where({ id: partId, project_id: projectId, shop_id: actor.shopId }).delete()) === 1;
}
