import type { Knex } from "knex";
import type { RingClass, RingField } from "#app/core/rings/ring-types.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { can } from "#app/domain/shop/permissions.ts";
import type { Board, BoardSummary, HoldMark } from "./board.ts";
import { type BoardFilter, boardsPerPage } from "./board-filter.ts";

/** The columns of a list row, named one by one. */
const summaryColumns = {
  id: "b.id",
  tag: "b.tag",
  species: "b.species",
  quarters: "b.quarters",
  thicknessMm: "b.thickness_mm",
  lengthMm: "b.length_mm",
  widthMm: "b.width_mm",
  widthFarMm: "b.width_far_mm",
  state: "b.state",
  ringClass: "b.ring_class",
  ringMinDeg: "b.ring_min_deg",
  ringMaxDeg: "b.ring_max_deg",
  ringField: "b.ring_field",
  moisturePct: "b.moisture_pct",
  figureKind: "b.figure_kind",
  figureStrength: "b.figure_strength",
  armId: "b.arm_id",
  bayName: "bay.name",
  armLevel: "arm.level",
} as const;

type SummaryRow = Record<keyof typeof summaryColumns, unknown> & { id: string };

/** Boards of the actor's shop that are not deleted. Every query on boards starts here, so none forgets its shop. */
export function boardsOf(db: Knex, actor: Pick<Actor, "shopId">): Knex.QueryBuilder {
  return db("boards as b").where("b.shop_id", actor.shopId).whereNull("b.deleted_at");
}

function withPlace(query: Knex.QueryBuilder): Knex.QueryBuilder {
  return query.leftJoin("arms as arm", "arm.id", "b.arm_id").leftJoin("bays as bay", "bay.id", "arm.bay_id");
}

function filtered(db: Knex, actor: Pick<Actor, "shopId">, filter: BoardFilter): Knex.QueryBuilder {
  const query = boardsOf(db, actor);
  if (filter.state !== "any") query.where("b.state", filter.state);
  if (filter.species) query.where("b.species", filter.species);
  if (filter.quarters) query.where("b.quarters", filter.quarters);
  if (filter.minLengthMm !== null) query.where("b.length_mm", ">=", filter.minLengthMm);
  if (filter.minWidthMm !== null) query.where("b.width_mm", ">=", filter.minWidthMm);
  if (filter.rings === "unread") query.whereNull("b.ring_class");
  else if (filter.rings) query.where("b.ring_class", filter.rings);
  if (filter.arm) query.where("b.arm_id", filter.arm);
  if (filter.moisture !== undefined) query.where("b.moisture_pct", "<=", filter.moisture);
  if (filter.figure) query.where("b.figure_kind", filter.figure);
  if (filter.delivery) query.where("b.delivery_id", filter.delivery);
  if (filter.project)
    query.whereIn("b.id", liveHolds(db, actor).where("h.project_id", filter.project).select("h.board_id"));
  if (filter.free) query.whereNotIn("b.id", liveHolds(db, actor).select("h.board_id"));
  if (filter.q) searchWords(query, filter.q);
  return query;
}

/** Holds that still claim something now. */
function liveHolds(db: Knex, actor: Pick<Actor, "shopId">): Knex.QueryBuilder {
  return db("holds as h")
    .where("h.shop_id", actor.shopId)
    .where((live) =>
      live
        .where("h.state", "out")
        .orWhere((held) => held.where("h.state", "held").where("h.expires_at", ">", db.fn.now(3))),
    );
}

/** Words of three letters and more that InnoDB leaves out of a full-text index (its default stopword list), so that to ask for one finds nothing. */
const unindexed = new Set(
  "about are com for from how that the this was what when where who will with und www".split(" "),
);

/** Words for how the rings run: asked for as people say them, "oak rift", though they are no part of a board's text. */
const ringWords = new Set<string>(["flat", "rift", "quartered"] satisfies RingClass[]);

/** Every word must begin some word of the board's text, or name its ring class; a bare number is a tag number, and what looks like a tag is one, or its beginning. */
function searchWords(query: Knex.QueryBuilder, typed: string): void {
  if (/^\d{1,9}$/.test(typed)) {
    query.where("b.tag_number", Number(typed));
    return;
  }
  const tag = /^([a-z]{1,3})-?(\d{1,9})$/i.exec(typed);
  if (tag) {
    query.where("b.tag", "like", `${tag[1]}-${tag[2]}%`);
    return;
  }
  const words = typed.match(/[\p{L}\p{N}]+/gu) ?? [];
  const isRingWord = (word: string) => ringWords.has(word.toLowerCase());
  const isIndexed = (word: string) => word.length >= 3 && !unindexed.has(word.toLowerCase());
  for (const word of words.filter(isRingWord))
    query.where((either) => either.where("b.ring_class", word).orWhere("b.search_text", "like", `%${word}%`));
  const others = words.filter((word) => !isRingWord(word));
  const long = others.filter(isIndexed);
  for (const word of others.filter((word) => !isIndexed(word))) query.where("b.search_text", "like", `%${word}%`);
  if (long.length > 0)
    query.whereRaw("MATCH (b.search_text) AGAINST (? IN BOOLEAN MODE)", long.map((word) => `+${word}*`).join(" "));
  if (words.length === 0) query.whereRaw("FALSE");
}

const orders: Record<BoardFilter["sort"], { column: string; order: "asc" | "desc" }> = {
  newest: { column: "b.tag_number", order: "desc" },
  tag: { column: "b.tag_number", order: "asc" },
  length: { column: "b.length_mm", order: "desc" },
  width: { column: "b.width_mm", order: "desc" },
  moisture: { column: "b.moisture_pct", order: "asc" },
  angle: { column: "b.ring_mean_deg", order: "desc" },
};

/** Puts a list in order, ties by identifier in the same direction, so that one index serves both. */
function inOrder(query: Knex.QueryBuilder, filter: BoardFilter): Knex.QueryBuilder {
  const order = orders[filter.sort];
  // What nobody has metered is not the driest.
  if (filter.sort === "moisture" && filter.moisture === undefined) query.orderByRaw("b.moisture_pct IS NULL");
  return query.orderBy([order, { column: "b.id", order: order.order }]);
}

/** One page of the list, with how many boards match in all. */
export async function listBoards(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  filter: BoardFilter,
): Promise<{ boards: BoardSummary[]; total: number; pages: number }> {
  const { total } = await filtered(db, actor, filter).count({ total: "*" }).first();
  const pages = Math.max(1, Math.ceil(Number(total) / boardsPerPage));
  const page = Math.min(filter.page, pages);
  const boards = await listSummaries(db, actor, filter, { limit: boardsPerPage, offset: (page - 1) * boardsPerPage });
  return { boards, total: Number(total), pages };
}

/** Matching boards in the list's order, a slice of them: a page, or a block of a download. */
export async function listSummaries(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  filter: BoardFilter,
  slice: { limit: number; offset: number },
): Promise<BoardSummary[]> {
  // The slice is found on an index alone; only its rows are then read whole.
  const ids = inOrder(filtered(db, actor, filter), filter)
    .limit(slice.limit)
    .offset(slice.offset)
    .select("b.id");
  const whole = withPlace(db("boards as b").join(ids.as("slice"), "slice.id", "b.id"));
  const rows = await inOrder(whole, filter).select(summaryColumns);
  return withHolds(db, actor, rows);
}

/** Boards on arms, for the rack as one stands before it: by arm, in the order they lie. */
export async function listRacked(
  db: Knex,
  actor: Pick<Actor, "shopId">,
): Promise<(BoardSummary & { armPosition: number })[]> {
  const rows = await withPlace(boardsOf(db, actor).where("b.state", "racked").whereNotNull("b.arm_id"))
    .orderBy(["b.arm_id", "b.arm_position", "b.tag_number"])
    .select({ ...summaryColumns, armPosition: "b.arm_position" });
  const boards = await withHolds(db, actor, rows);
  return boards.map((board, index) => ({ ...board, armPosition: rows[index].armPosition }));
}

/** Boards by their identifiers, in tag order; strangers' are left out. */
export async function listByIds(db: Knex, actor: Pick<Actor, "shopId">, ids: string[]): Promise<BoardSummary[]> {
  if (ids.length === 0) return [];
  const rows = await withPlace(boardsOf(db, actor).whereIn("b.id", ids)).orderBy("b.tag_number").select(summaryColumns);
  return withHolds(db, actor, rows);
}

/** Live claims on some boards, by board. */
export async function holdMarks(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardIds: string[],
): Promise<Map<string, HoldMark[]>> {
  const marks = new Map<string, HoldMark[]>();
  if (boardIds.length === 0) return marks;
  const rows = await liveHolds(db, actor)
    .join("projects as p", "p.id", "h.project_id")
    .join("people as who", "who.id", "h.placed_by")
    .whereIn("h.board_id", boardIds)
    .orderBy("h.from_mm")
    .select({
      boardId: "h.board_id",
      holdId: "h.id",
      projectId: "p.id",
      projectName: "p.name",
      crayon: "p.crayon",
      fromMm: "h.from_mm",
      toMm: "h.to_mm",
      state: "h.state",
      placedBy: "who.name",
      placedById: "who.id",
      expiresAt: "h.expires_at",
    });
  for (const { boardId, ...mark } of rows) marks.set(boardId, [...(marks.get(boardId) ?? []), mark]);
  return marks;
}

async function withHolds(db: Knex, actor: Pick<Actor, "shopId">, rows: SummaryRow[]): Promise<BoardSummary[]> {
  const marks = await holdMarks(
    db,
    actor,
    rows.map((row) => row.id),
  );
  return rows.map((row) => toSummary(row, marks.get(row.id) ?? []));
}

function toSummary(row: SummaryRow, holds: HoldMark[]): BoardSummary {
  const { ringField, bayName, armLevel, armPosition, ...rest } = row as SummaryRow & { armPosition?: number };
  return {
    ...(rest as unknown as Omit<BoardSummary, "rings" | "place" | "holds">),
    rings: parseField(ringField),
    place: bayName ? `Bay ${bayName}, arm ${armLevel}` : null,
    holds,
  };
}

function parseField(value: unknown): RingField | null {
  if (value === null || value === undefined) return null;
  return (typeof value === "string" ? JSON.parse(value) : value) as RingField;
}

/** The whole record, or null when there is none in this shop. Cost is read only for those who may see it. */
export async function getBoard(db: Knex, actor: Actor, boardId: string): Promise<Board | null> {
  const row = await withPlace(boardsOf(db, actor).where("b.id", boardId))
    .leftJoin("deliveries as d", "d.id", "b.delivery_id")
    .leftJoin("suppliers as s", "s.id", "d.supplier_id")
    .leftJoin("boards as parent", "parent.id", "b.parent_board_id")
    .first({
      ...summaryColumns,
      tagNumber: "b.tag_number",
      deliveryId: "b.delivery_id",
      receivedOn: "d.received_on",
      supplierName: "s.name",
      reference: "d.reference",
      parentId: "parent.id",
      parentTag: "parent.tag",
      edges: "b.edges",
      surface: "b.surface",
      grade: "b.grade",
      figureWhere: "b.figure_where",
      sapSharePct: "b.sap_share_pct",
      colourNote: "b.colour_note",
      notes: "b.notes",
      logName: "b.log_name",
      logSequence: "b.log_sequence",
      costMinor: "b.cost_minor",
      ringMeanDeg: "b.ring_mean_deg",
      moistureAt: "b.moisture_at",
      version: "b.version",
      createdAt: "b.created_at",
    });
  if (!row) return null;
  const { receivedOn, supplierName, reference, parentId, parentTag, costMinor, ...rest } = row;
  const marks = await holdMarks(db, actor, [boardId]);
  return {
    ...(toSummary(rest, marks.get(boardId) ?? []) as Board),
    delivery: rest.deliveryId ? { receivedOn, supplierName, reference } : null,
    parent: parentId ? { id: parentId, tag: parentTag } : null,
    costMinor: can(actor.role, "cost:see") ? costMinor : null,
  };
}

/** Locks a board's row for the rest of the transaction, so that two people cannot change it at once. Null when it is not in this shop. */
export async function lockBoard(
  trx: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
): Promise<{ id: string; tag: string; state: Board["state"]; lengthMm: number; version: number } | null> {
  const row = await boardsOf(trx, actor)
    .where("b.id", boardId)
    .forUpdate()
    .first({ id: "b.id", tag: "b.tag", state: "b.state", lengthMm: "b.length_mm", version: "b.version" });
  return row ?? null;
}

/** Racked boards that could stand in for one: same species and quarters, long enough, nothing held on them, the nearest ring angle first. */
export async function listSimilar(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardId: string,
  leastLengthMm: number,
  limit: number,
): Promise<BoardSummary[]> {
  const like = await boardsOf(db, actor).where("b.id", boardId).first("b.species", "b.quarters", "b.ring_mean_deg");
  if (!like) return [];
  const rows = await withPlace(boardsOf(db, actor))
    .where({ "b.state": "racked", "b.species": like.species, "b.quarters": like.quarters })
    .whereNot("b.id", boardId)
    .where("b.length_mm", ">=", leastLengthMm)
    .whereNotIn("b.id", liveHolds(db, actor).select("h.board_id"))
    .orderByRaw("ABS(COALESCE(b.ring_mean_deg, 200) - ?), b.length_mm", [like.ring_mean_deg ?? 0])
    .limit(limit)
    .select(summaryColumns);
  return rows.map((row: SummaryRow) => toSummary(row, []));
}

/** Boards on which a project holds something now, in tag order. */
export async function listHeldFor(db: Knex, actor: Pick<Actor, "shopId">, projectId: string): Promise<BoardSummary[]> {
  const ids: { board_id: string }[] = await liveHolds(db, actor)
    .where("h.project_id", projectId)
    .distinct("h.board_id");
  return listByIds(
    db,
    actor,
    ids.map((row) => row.board_id),
  );
}

/** What boards cost, in minor units, where it is known. For those who may see it: the caller has asked. */
export async function boardCosts(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  boardIds: string[],
): Promise<Map<string, number>> {
  if (boardIds.length === 0) return new Map();
  const rows = await boardsOf(db, actor)
    .whereIn("b.id", boardIds)
    .whereNotNull("b.cost_minor")
    .select("b.id", "b.cost_minor");
  return new Map(rows.map((row: { id: string; cost_minor: number }) => [row.id, row.cost_minor]));
}

/** Racked boards of some species, with what each costs, for planning. In tag order, at most as many as a plan takes. */
export async function listRackOf(
  db: Knex,
  actor: Pick<Actor, "shopId">,
  species: string[],
  limit: number,
): Promise<{ board: BoardSummary; costMinor: number | null }[]> {
  if (species.length === 0) return [];
  const rows = await withPlace(boardsOf(db, actor).where("b.state", "racked").whereIn("b.species", species))
    .orderBy("b.tag_number")
    .limit(limit)
    .select({ ...summaryColumns, costMinor: "b.cost_minor" });
  const costs = rows.map((row: { costMinor: number | null }) => row.costMinor);
  const boards = await withHolds(db, actor, rows);
  return boards.map((board, i) => ({ board, costMinor: costs[i] ?? null }));
}
