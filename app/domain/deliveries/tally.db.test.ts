import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aDelivery, aTallyLine } from "#tests/factories/delivery.ts";
import { anActor } from "#tests/factories/shop.ts";
import { type FreshDatabase, freshDatabase, useTestDb } from "#tests/setup/test-db.ts";
import { getDelivery } from "./deliveries.sql.server.ts";
import { saveTally } from "./tally.server.ts";

const now = new Date("2027-03-01T09:00:00.123Z");
const later = new Date("2027-03-01T10:00:00.456Z");

describe("saving a tally", () => {
  const db = useTestDb();

  async function scene(given = {}) {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const delivery = await aDelivery(db(), ana, given);
    const boards = () => db()("boards").where({ delivery_id: delivery.id }).orderBy("tag_number");
    return { ana, delivery, boards };
  }

  it("makes each board with its own tag, consecutive, in the order tallied", async () => {
    const { ana, delivery, boards } = await scene({ grade: "FAS" });
    const lines = [aTallyLine({ count: 2 }), aTallyLine({ species: "black-walnut", quarters: 8, widthFarMm: 180 })];
    expect(await saveTally(db(), ana, delivery.id, lines, now)).toMatchObject({
      ok: true,
      firstTag: "WO-0001",
      lastTag: "BW-0003",
    });
    const rows = await boards();
    expect(rows.map((row) => row.tag)).toEqual(["WO-0001", "WO-0002", "BW-0003"]);
    expect(rows[2]).toMatchObject({
      quarters: 8,
      thickness_mm: 50.8,
      width_mm: 203.2,
      width_far_mm: 180,
      length_mm: 2438.4,
      grade: "FAS",
      state: "racked",
    });
    const events = await db()("board_events").whereIn(
      "board_id",
      rows.map((row) => row.id),
    );
    expect(events).toHaveLength(3);
    expect((await getDelivery(db(), ana, delivery.id))?.talliedAt).toEqual(now);
  });

  it("shares price and freight out so that the boards' costs add up to the whole", async () => {
    const { ana, delivery, boards } = await scene();
    await saveTally(db(), ana, delivery.id, [aTallyLine({ count: 6 }), aTallyLine({ widthMm: 190.5 })], now);
    const costs: number[] = (await boards()).map((row) => row.cost_minor);
    expect(costs.reduce((a, b) => a + b)).toBe(200 * 875 + 5000);
    expect(costs[6]).toBeLessThan(costs[0] ?? 0);
  });

  it("leaves costs open without a price", async () => {
    const { ana, delivery, boards } = await scene({ priceMinor: null });
    await saveTally(db(), ana, delivery.id, [aTallyLine()], now);
    expect((await boards())[0]?.cost_minor).toBeNull();
  });

  it("is refused a second time, and says when the first was", async () => {
    const { ana, delivery, boards } = await scene();
    await saveTally(db(), ana, delivery.id, [aTallyLine()], now);
    expect(await saveTally(db(), ana, delivery.id, [aTallyLine()], later)).toEqual({
      ok: false,
      why: "tallied",
      at: now,
    });
    expect(await boards()).toHaveLength(1);
  });

  it("adds boards that were missed to a tally one knows of, the cost shared anew over all", async () => {
    const { ana, delivery, boards } = await scene();
    await saveTally(db(), ana, delivery.id, [aTallyLine({ count: 2 })], now);
    expect(await saveTally(db(), ana, delivery.id, [aTallyLine()], later, now)).toMatchObject({
      ok: true,
      firstTag: "WO-0003",
    });
    const costs: number[] = (await boards()).map((row) => row.cost_minor);
    expect(costs).toEqual([60_000, 60_000, 60_000]);
    // Two people adding at once: the second knows only of the tally before.
    expect(await saveTally(db(), ana, delivery.id, [aTallyLine()], later, now)).toMatchObject({
      ok: false,
      why: "tallied",
    });
  });

  it("of nothing, or of too much, is refused", async () => {
    const { ana, delivery } = await scene();
    expect(await saveTally(db(), ana, delivery.id, [], now)).toEqual({ ok: false, why: "empty" });
    const many = Array.from({ length: 5 }, () => aTallyLine({ count: 500 }));
    expect(await saveTally(db(), ana, delivery.id, many, now)).toEqual({ ok: false, why: "too many" });
  });

  it("of another shop's delivery, or a deleted one, finds nothing", async () => {
    const { delivery, ana } = await scene();
    const stranger = await anActor(db());
    expect(await saveTally(db(), stranger, delivery.id, [aTallyLine()], now)).toEqual({ ok: false, why: "missing" });
    await db()("deliveries").where({ id: delivery.id }).update({ deleted_at: now });
    expect(await saveTally(db(), ana, delivery.id, [aTallyLine()], now)).toEqual({ ok: false, why: "missing" });
  });
});

describe("tallies that meet", () => {
  let fresh: FreshDatabase;
  beforeAll(async () => {
    fresh = await freshDatabase();
  });
  afterAll(() => fresh.drop());

  const tagNumbers = (deliveryId: string): Promise<number[]> =>
    fresh.db("boards").where({ delivery_id: deliveryId }).orderBy("tag_number").pluck("tag_number");
  const isRun = (numbers: number[]) => numbers.every((number, index) => number === (numbers[0] ?? 0) + index);

  it("two deliveries saved at once from two connections get runs of tags that do not touch each other", async () => {
    const ana = await anActor(fresh.db);
    const [one, two] = [await aDelivery(fresh.db, ana), await aDelivery(fresh.db, ana)];
    const [desk, phone] = [fresh.open(), fresh.open()];
    const saved = await Promise.all([
      saveTally(desk, ana, one.id, [aTallyLine({ count: 300 })], now),
      saveTally(phone, ana, two.id, [aTallyLine({ count: 200 })], now),
    ]);
    expect(saved.every(({ ok }) => ok)).toBe(true);
    const runs = [await tagNumbers(one.id), await tagNumbers(two.id)];
    expect(runs.map((run) => run.length)).toEqual([300, 200]);
    expect(runs.every(isRun)).toBe(true);
    expect(runs.flat().sort((a, b) => a - b)).toEqual(Array.from({ length: 500 }, (_, index) => index + 1));
  });

  it("one delivery saved at once from ten connections makes its boards once", async () => {
    const ana = await anActor(fresh.db);
    const { id } = await aDelivery(fresh.db, ana);
    const pools = Array.from({ length: 10 }, () => fresh.open(1));
    const saved = await Promise.all(pools.map((pool) => saveTally(pool, ana, id, [aTallyLine({ count: 12 })], now)));
    expect(saved.filter(({ ok }) => ok)).toHaveLength(1);
    for (const refused of saved.filter(({ ok }) => !ok)) expect(refused).toMatchObject({ why: "tallied" });
    expect(await tagNumbers(id)).toHaveLength(12);
  });

  it("one that fails half way leaves nothing: no boards, no history, no gap in the tags", async () => {
    const ana = await anActor(fresh.db);
    const { id } = await aDelivery(fresh.db, ana);
    // Longer than the column holds: the second block of rows fails when the first is in.
    const lines = [aTallyLine({ count: 500 }), aTallyLine({ species: "x".repeat(70) })];
    await expect(saveTally(fresh.db, ana, id, lines, now)).rejects.toThrow(/Data too long/);
    expect(await tagNumbers(id)).toEqual([]);
    expect(await fresh.db("board_events").where({ shop_id: ana.shopId })).toEqual([]);
    expect((await getDelivery(fresh.db, ana, id))?.talliedAt).toBeNull();
    expect(await saveTally(fresh.db, ana, id, [aTallyLine()], now)).toMatchObject({ firstTag: "WO-0001" });
  });
});
