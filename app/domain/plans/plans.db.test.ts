import { afterAll, describe, expect, test } from "vitest";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import { insertPart, listParts } from "#app/domain/projects/projects.sql.server.ts";
import { getShop } from "#app/domain/shop/shops.sql.server.ts";
import { createPlanner } from "#app/services/planner.server.ts";
import { aBoard, aProject } from "#tests/factories/board.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { acceptPlan, makePlan } from "./plans.server.ts";

const inch = 25.4;
const now = new Date("2027-03-01T09:00:00Z");
const hold = { note: "by plan", expiresAt: new Date(now.getTime() + 14 * 86_400_000) };
const weights = { boardChargeMinor: 200, offcutCredit: 0.5, ringShare: 0.9 };

describe("planning a project's parts on the rack", () => {
  const db = useTestDb();
  const planner = createPlanner();
  afterAll(() => planner.close());

  async function scene() {
    const maker = await anActor(db(), "maker");
    const project = await aProject(db(), maker);
    const shop = await getShop(db(), maker.shopId);
    if (!shop) throw new Error("no shop");
    const part = {
      name: "Rail",
      quantity: 4,
      thicknessMm: 0.75 * inch,
      widthMm: 3 * inch,
      lengthMm: 40 * inch,
      species: "white-oak",
      ringMinDeg: 0,
      ringMaxDeg: 90,
    };
    const plan = () => makePlan({ db: db(), planner }, maker, shop, project.id, weights);
    return { maker, project, shop, part, plan };
  }

  test("every part finds its place inside the free length of a board, and accepting holds just those stretches", async () => {
    const { maker, project, part, plan } = await scene();
    await insertPart(db(), maker, project.id, part);
    const board = await aBoard(db(), maker, { width_mm: 8 * inch, length_mm: 96 * inch, cost_minor: 5000 });
    const other = await aProject(db(), maker);
    await placeHold(db(), maker, { boardId: board.id, projectId: other.id, fromMm: 0, toMm: 5 * inch, ...hold }, now);
    const made = await plan();
    if (!made.ok) throw new Error(made.why);
    expect(made.plan.unplaced).toEqual([]);
    expect(made.plan.boards.flatMap(({ layout }) => layout.pieces)).toHaveLength(4);
    for (const { holds } of made.plan.boards) expect(holds.fromMm).toBeGreaterThanOrEqual(5 * inch - 0.001);
    expect(
      await acceptPlan(
        db(),
        maker,
        project.id,
        made.plan.boards.map(({ holds }) => holds),
        hold,
        now,
      ),
    ).toEqual({ ok: true, holds: made.plan.boards.length });
    expect(await db()("holds").where({ project_id: project.id, state: "held" })).toHaveLength(made.plan.boards.length);
  });

  test("when one board changed meanwhile nothing is held, and it is named", async () => {
    const { maker, project } = await scene();
    const [free, taken] = [await aBoard(db(), maker), await aBoard(db(), maker)];
    const other = await aProject(db(), maker);
    await placeHold(db(), maker, { boardId: taken.id, projectId: other.id, fromMm: 100, toMm: 400, ...hold }, now);
    const stretches = [free, taken].map((board) => ({ boardId: board.id, fromMm: 0, toMm: 1000 }));
    const accepted = await acceptPlan(db(), maker, project.id, stretches, hold, now);
    expect(accepted).toMatchObject({ ok: false, refused: [{ boardId: taken.id, refusal: { why: "held" } }] });
    expect(await db()("holds").where({ project_id: project.id })).toEqual([]);
  });

  test("rift parts come from where the rings are rift; boards nobody has read give none", async () => {
    const { maker, project, part, plan } = await scene();
    await insertPart(db(), maker, project.id, { ...part, quantity: 1, ringMinDeg: 30, ringMaxDeg: 60 });
    await aBoard(db(), maker);
    const made = await plan();
    if (!made.ok) throw new Error(made.why);
    expect(made.plan.boards).toEqual([]);
    expect(made.plan.unplaced[0]).toMatchObject({ part: "Rail", quantity: 1 });
  });

  test("a species that is not on the rack is said, as is a project without parts; a stranger's boards are no help", async () => {
    const { maker, project, part, plan } = await scene();
    expect(await plan()).toMatchObject({ ok: false });
    await insertPart(db(), maker, project.id, part);
    await aBoard(db(), await anActor(db(), "maker"));
    const made = await plan();
    expect(made).toMatchObject({ ok: true, plan: { boards: [], unmade: ["Rail"] } });
    expect(await listParts(db(), maker, project.id)).toHaveLength(1);
  });
});
