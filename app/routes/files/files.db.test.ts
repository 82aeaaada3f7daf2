import Papa from "papaparse";
import { describe, expect, test } from "vitest";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { newId } from "#app/services/ids.server.ts";
import { contextFor } from "#tests/factories/at-work.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor, aShop } from "#tests/factories/shop.ts";
import { codesOnFirstPage } from "#tests/print/read-codes.ts";
import { canRender } from "#tests/print/render-page.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { loader as boardsCsv } from "./boards-csv.ts";
import { loader as tagsPdf } from "./tags-pdf.ts";

const db = useTestDb();

async function download(loader: unknown, actor: Actor, query: string): Promise<Response> {
  const url = new URL(`http://rack.example/files/x?${query}`);
  const args = { request: new Request(url), url, params: {}, context: await contextFor(db(), actor), pattern: "" };
  return (await (loader as (args: unknown) => unknown)(args)) as Response;
}

/** The rows of the boards' CSV, as a general reader of such files reads them. */
async function rows(actor: Actor, query = ""): Promise<Record<string, string>[]> {
  const response = await download(boardsCsv, actor, query);
  expect(response.headers.get("Content-Type")).toBe("text/csv; charset=utf-8");
  const { data, errors } = Papa.parse<Record<string, string>>(await response.text(), {
    header: true,
    skipEmptyLines: true,
  });
  expect(errors).toEqual([]);
  return data;
}

describe("the boards as CSV", () => {
  test("are all of them, not a page: 4,100 boards, each once, in the list's order", async () => {
    const ana = await anActor(db());
    const many = 4_100;
    const made = Array.from({ length: many }, (_, i) => ({
      id: newId(),
      shop_id: ana.shopId,
      tag_number: i + 1,
      tag: `WO-${String(i + 1).padStart(4, "0")}`,
      species: "white-oak",
      quarters: 4,
      thickness_mm: 25.4,
      length_mm: 2438.4,
      width_mm: 203.2,
    }));
    await db().batchInsert("boards", made, 1000);
    const tags = (await rows(ana, "sort=length")).map((row) => row.tag);
    expect(new Set(tags).size).toBe(many);
    expect(tags).toHaveLength(many);
    expect((await rows(ana, "sort=tag")).map((row) => row.tag)).toEqual(made.map(({ tag }) => tag));
  });

  test("are filtered as the list is, and none when nothing matches", async () => {
    const ana = await anActor(db());
    await aBoard(db(), ana, { tag: "WO-9001" });
    await aBoard(db(), ana, { tag: "BW-9002", species: "black-walnut", state: "used" });
    await aBoard(db(), await anActor(db()), { tag: "WO-9003" });
    expect((await rows(ana)).map((row) => row.tag)).toEqual(["WO-9001"]);
    expect((await rows(ana, "state=any&species=black-walnut")).map((row) => row.tag)).toEqual(["BW-9002"]);
    expect(await rows(ana, "state=sold")).toEqual([]);
    expect((await rows(ana, "state=nonsense&page=900")).map((row) => row.tag)).toEqual(["WO-9001"]);
  });

  // A board foot is 144 cubic inches (NIST Handbook 44): 1 by 8 by 96 in are 5.33 of them.
  test("say sizes in the shop's units", async () => {
    const ana = await anActor(db());
    await aBoard(db(), ana);
    await aBoard(db(), ana, { width_far_mm: 209.55 });
    const [straight, tapered] = await rows(ana, "sort=tag");
    expect(straight).toMatchObject({
      "thickness (in)": "1",
      "width (in)": "8",
      "far width (in)": "",
      "length (in)": "96",
      "board feet": "5.33",
    });
    expect(tapered).toMatchObject({ "width (in)": "8", "far width (in)": "8.25" });
    const metric = await anActor(db(), "maker", { shopId: await aShop(db(), { units: "mm" }) });
    await aBoard(db(), metric);
    expect((await rows(metric))[0]).toMatchObject({ "width (mm)": "203.2", "length (mm)": "2438.4" });
  });

  test("run no formula in a spreadsheet, whatever people wrote", async () => {
    const ana = await anActor(db());
    const bad = '=HYPERLINK("https://evil.example","x")';
    const [bay, arm] = [newId(), newId()];
    await db()("bays").insert({ id: bay, shop_id: ana.shopId, name: bad.slice(0, 40) });
    await db()("arms").insert({ id: arm, shop_id: ana.shopId, bay_id: bay, level: 1 });
    const board = await aBoard(db(), ana, { arm_id: arm, figure_kind: "+cmd|' /C calc'!A0", grade: "@SUM(A1)" });
    const project = await aProject(db(), ana, { name: bad });
    const hold = { boardId: board.id, projectId: project.id, fromMm: 0, toMm: 100, note: bad };
    await placeHold(db(), ana, { ...hold, expiresAt: new Date(Date.now() + 86_400_000) }, new Date());
    const [row = {}] = await rows(ana);
    expect(row["reserved for"]).toBe(`'${bad}`);
    expect(row.figure).toBe("'+cmd|' /C calc'!A0");
    for (const value of Object.values(row)) expect(value).not.toMatch(/^[=+\-@\t\r]/);
  });

  test("tell a helper no money", async () => {
    const owner = await anActor(db(), "owner");
    const helper = await anActor(db(), "helper", { shopId: owner.shopId });
    await aBoard(db(), owner, { cost_minor: 7_654_321 });
    const [row = {}] = await rows(helper);
    expect(Object.keys(row).filter((name) => /cost|price|money/i.test(name))).toEqual([]);
    expect(JSON.stringify(row).replace(/[.,]/g, "")).not.toContain("7654321");
  });
});

describe.skipIf(!canRender)("tags as PDF", () => {
  test.each(["roll-62x29", "letter-30", "a4-21"])(
    "on %s open the boards they are for, at the shop's address",
    async (sheet) => {
      const ana = await anActor(db(), "helper");
      const boards = [await aBoard(db(), ana), await aBoard(db(), ana)];
      const asked = new URLSearchParams([["sheet", sheet], ...boards.map(({ id }) => ["board", id])]);
      const response = await download(tagsPdf, ana, String(asked));
      expect(response.headers.get("Content-Type")).toBe("application/pdf");
      const codes = await codesOnFirstPage(new Uint8Array(await response.arrayBuffer()));
      const addresses = boards.map(({ id }) => `http://rack.example/boards/${id}`);
      // A roll has a page for each label.
      expect(codes.sort()).toEqual((sheet.startsWith("roll") ? addresses.slice(0, 1) : addresses).sort());
    },
  );
});
