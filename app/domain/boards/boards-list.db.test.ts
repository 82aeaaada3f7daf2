import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { type FreshDatabase, freshDatabase } from "#tests/setup/test-db.ts";
import { boardsPerPage, readBoardFilter } from "./board-filter.ts";
import { listBoards } from "./boards.sql.server.ts";
import { searchText } from "./search-text.ts";

// Words are found through a full-text index, which shows only what has been committed.
let fresh: FreshDatabase;
beforeAll(async () => {
  fresh = await freshDatabase();
});
afterAll(() => fresh.drop());

type Query = string | Record<string, string>;
const list = (actor: Actor, query: Query) =>
  listBoards(fresh.db, actor, readBoardFilter(new URLSearchParams(query), "in"));

describe("filters", () => {
  let ana: Actor;
  let arm: string;
  let project: { id: string };
  let delivery: string;
  /** Names of boards by identifier. */
  const names = new Map<string, string>();

  async function board(name: string, given: Record<string, unknown>): Promise<string> {
    const { id } = await aBoard(fresh.db, ana, given);
    names.set(id, name);
    return id;
  }
  const found = async (query: Query) => (await list(ana, query)).boards.map(({ id }) => names.get(id)).sort();

  beforeAll(async () => {
    ana = await anActor(fresh.db);
    const [bay, supplier] = [newId(), newId()];
    [arm, delivery] = [newId(), newId()];
    await fresh.db("bays").insert({ id: bay, shop_id: ana.shopId, name: "A" });
    await fresh.db("arms").insert({ id: arm, shop_id: ana.shopId, bay_id: bay, level: 2 });
    await fresh.db("suppliers").insert({ id: supplier, shop_id: ana.shopId, name: "Mill" });
    await fresh.db("deliveries").insert({
      id: delivery,
      shop_id: ana.shopId,
      supplier_id: supplier,
      received_on: "2027-01-01",
      species: "black-walnut",
      quarters: 8,
      created_by: ana.personId,
    });
    project = await aProject(fresh.db, ana);
    await board("plain", {});
    await board("walnut", { species: "black-walnut", quarters: 8, delivery_id: delivery });
    await board("long", { length_mm: 3048 });
    await board("wide", { width_mm: 304.8 });
    await board("rift", { ring_class: "rift", ring_min_deg: 35, ring_max_deg: 55, ring_mean_deg: 45 });
    await board("dry", { moisture_pct: 7.5, arm_id: arm });
    await board("curly", { figure_kind: "curl", figure_strength: 2 });
    await board("used", { state: "used" });
    await board("deleted", { deleted_at: new Date() });
    const held = await board("held", {});
    const lapsed = await board("lapsed", {});
    const hold = { projectId: project.id, fromMm: 0, toMm: 500, note: "", expiresAt: new Date(Date.now() + 3_600_000) };
    await placeHold(fresh.db, ana, { ...hold, boardId: held }, new Date());
    await placeHold(fresh.db, ana, { ...hold, boardId: lapsed }, new Date());
    await fresh
      .db("holds")
      .where({ board_id: lapsed })
      .update({ expires_at: new Date(0) });
    const stranger = await anActor(fresh.db);
    names.set((await aBoard(fresh.db, stranger)).id, "stranger's");
  });

  const racked = ["curly", "dry", "held", "lapsed", "long", "plain", "rift", "walnut", "wide"];
  const but = (...left: string[]) => racked.filter((name) => !left.includes(name));

  test.each<[Query, string[]]>([
    ["", racked],
    ["state=any", [...racked, "used"].sort()],
    ["state=used", ["used"]],
    ["state=sold", []],
    ["species=black-walnut", ["walnut"]],
    ["quarters=8", ["walnut"]],
    [{ length: "10'" }, ["long"]],
    [{ length: "10' 1/64" }, []],
    [{ width: "12" }, ["wide"]],
    ["rings=rift", ["rift"]],
    ["rings=flat", []],
    ["rings=unread", but("rift")],
    ["moisture=7.5", ["dry"]],
    ["moisture=7", []],
    ["figure=curl", ["curly"]],
    ["free=yes", but("held")],
    ["species=white-oak&quarters=4&rings=unread&free=yes", but("walnut", "rift", "held")],
  ])("%o", async (query, expected) => {
    expect(await found(query)).toEqual(expected);
  });

  test("by place, project and delivery", async () => {
    expect(await found({ arm })).toEqual(["dry"]);
    expect(await found({ project: project.id })).toEqual(["held"]);
    expect(await found({ delivery })).toEqual(["walnut"]);
  });

  test("somebody else's place, project or delivery shows nothing", async () => {
    const stranger = await anActor(fresh.db);
    for (const [name, id] of Object.entries({ arm, project: project.id, delivery }))
      expect((await list(stranger, { [name]: id, state: "any" })).total).toBe(0);
  });

  // The database refuses to compare an identifier with what has signs beyond ASCII.
  test.each(["☃", "é".repeat(13), "\0", "%", "' OR 1=1", "\ud800"])("%j as a filter breaks nothing", async (odd) => {
    for (const name of ["arm", "project", "delivery"]) expect(await found({ [name]: odd })).toEqual(racked);
    for (const name of ["species", "figure"]) await expect(found({ [name]: odd })).resolves.toBeInstanceOf(Array);
  });
});

describe("searching", () => {
  let ana: Actor;
  const names = new Map<string, string>();
  const found = async (q: string) => (await list(ana, { q })).boards.map(({ id }) => names.get(id)).sort();

  beforeAll(async () => {
    ana = await anActor(fresh.db);
    const words = [
      { name: "barn", tag: "WO-0007", notes: "From the old barn, with a live edge; 100% air-dried_outside" },
      {
        name: "quilt",
        tag: "MA-0070",
        species: "hard-maple",
        figureKind: "quilt",
        notes: "O'Brien's log",
        ringClass: "rift",
      },
      { name: "bird", tag: "MA-0142", species: "hard-maple", figureKind: "bird's eye", colourNote: "crème, pommelé" },
      { name: "elm", tag: "EL-0143", species: "american-elm", notes: "楓の木 🪵 Ulmenholz größer; lay flat" },
    ];
    for (const { name, tag, ...given } of words) {
      const board = {
        tag,
        species: "white-oak",
        grade: "",
        figureKind: "",
        figureWhere: "",
        colourNote: "",
        notes: "",
        logName: "",
        ringClass: null,
        ...given,
      };
      const { id } = await aBoard(fresh.db, ana, {
        tag,
        tag_number: Number(tag.slice(3)),
        species: board.species,
        figure_kind: board.figureKind,
        ring_class: board.ringClass,
        notes: board.notes,
        search_text: searchText(board),
      });
      names.set(id, name);
    }
  });

  test.each([
    ["7", ["barn"]],
    ["0142", ["bird"]],
    ["WO-0007", ["barn"]],
    ["wo7", []],
    ["ma-0", ["bird", "quilt"]],
    ["MA", ["bird", "quilt"]],
    ["maple", ["bird", "quilt"]],
    ["hard map", ["bird", "quilt"]],
    ["maple quilt", ["quilt"]],
    ["quilt maple", ["quilt"]],
    ["maple barn", []],
    ["bird's eye", ["bird"]],
    ["O'Brien", ["quilt"]],
    ["o'brien's log", ["quilt"]],
    ["pommele", ["bird"]],
    ["CRÈME", ["bird"]],
    ["größ", ["elm"]],
    ["live edge", ["barn"]],
    ["old barn", ["barn"]],
    ["from the old barn", ["barn"]],
    ["with a live edge", ["barn"]],
    ["the", ["barn"]],
    ["air-dried", ["barn"]],
    ["100%", ["barn"]],
    ["楓の木", ["elm"]],
    ["ULMENHOLZ 🪵", ["elm"]],
    ["rift", ["quilt"]],
    ["Maple rift", ["quilt"]],
    ["oak rift", []],
    ["quartered maple", []],
    ["flat elm", ["elm"]],
  ])("%s", async (q, expected) => {
    expect(await found(q)).toEqual(expected);
  });

  // Signs are no words of a query language: they find nothing by themselves, and change nothing of what the words beside them find.
  test.each([
    ["%", []],
    ["_", []],
    ["%%%", []],
    ['+-*"()@~<>', []],
    ["+", []],
    ["'", []],
    ["\\", []],
    ["🪵", []],
    ["\0", []],
    ["\ud800", []],
    ["x".repeat(80), []],
    ["abc ".repeat(20), []],
    ["9".repeat(9), []],
    ["9".repeat(80), []],
    ["\\'; DROP TABLE boards; --", []],
    ["-maple", ["bird", "quilt"]],
    ['"maple', ["bird", "quilt"]],
    ["(maple", ["bird", "quilt"]],
    ["maple*", ["bird", "quilt"]],
    ["*maple", ["bird", "quilt"]],
    ["++maple", ["bird", "quilt"]],
    ["maple)(", ["bird", "quilt"]],
    ["maple @3", []],
    ["+maple -quilt", ["quilt"]],
    [">maple <quilt ~bird", []],
  ])("%j", async (q, expected) => {
    expect(await found(q)).toEqual(expected);
  });

  test.each(["a\0b", "é́́́", "ab ".repeat(26), "a b c d e f g h i j k l m n o p q r s t u v w x y z"])(
    "%j breaks nothing",
    async (q) => {
      await expect(found(q)).resolves.toBeInstanceOf(Array);
    },
  );

  test("10,000 characters are no search", async () => {
    expect(await found("x".repeat(10_000))).toEqual(["barn", "bird", "elm", "quilt"]);
  });
});

describe("pages", () => {
  let ana: Actor;
  const many = 2 * boardsPerPage + 20;
  let ids: Set<string>;

  beforeAll(async () => {
    ana = await anActor(fresh.db);
    ids = new Set();
    // Sort keys that many boards share, none, and some.
    for (let i = 0; i < many; i++) {
      const { id } = await aBoard(fresh.db, ana, {
        moisture_pct: i % 3 ? 8 : null,
        ring_mean_deg: i % 2 ? 45 : null,
        length_mm: i % 4 ? 2438.4 : 3048,
      });
      ids.add(id);
    }
  });

  test.each(["newest", "tag", "length", "width", "moisture", "angle"])(
    "sorted by %s: no board twice, none missing",
    async (sort) => {
      const seen: string[] = [];
      for (const page of ["1", "2", "3"]) {
        const { boards, total, pages } = await list(ana, { sort, page });
        expect([total, pages]).toEqual([many, 3]);
        seen.push(...boards.map(({ id }) => id));
      }
      expect(seen).toHaveLength(many);
      expect(new Set(seen)).toEqual(ids);
    },
  );

  test("each order is as it says", async () => {
    const column = async <K extends "lengthMm" | "widthMm" | "moisturePct" | "tag">(sort: string, key: K) =>
      (await list(ana, { sort })).boards.map((board) => board[key]);
    const lengths = (await column("length", "lengthMm")) as number[];
    expect(lengths).toEqual([...lengths].sort((a, b) => b - a));
    expect(lengths[0]).toBe(3048);
    const tags = await column("tag", "tag");
    expect(tags).toEqual([...tags].sort());
    expect(await column("newest", "tag")).not.toEqual(tags);
    expect(await column("moisture", "moisturePct")).not.toContain(null);
  });

  test("past the last page is the last page", async () => {
    const last = await list(ana, { page: "3" });
    expect(last.boards).toHaveLength(20);
    expect(await list(ana, { page: "100000" })).toEqual(last);
  });
});
