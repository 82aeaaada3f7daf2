import { describe, expect, it } from "vitest";
import { aDelivery, aDeliveryForm, aTallyLine } from "#tests/factories/delivery.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { changeDelivery, deleteDelivery, receiveDelivery, shareCostAgain } from "./deliveries.server.ts";
import { getDelivery, listDeliveries, listLot } from "./deliveries.sql.server.ts";
import { readDeliveryFilter } from "./delivery-filter.ts";
import { addSupplier, changeSupplier } from "./suppliers.server.ts";
import { getSupplier, listSuppliers, supplierNamed } from "./suppliers.sql.server.ts";
import { saveTally } from "./tally.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const filter = (search = "") => readDeliveryFilter(new URLSearchParams(search));
const supplier = { name: "Kestrel Mill", email: "", phone: "", notes: "" };

describe("logging a delivery", () => {
  const db = useTestDb();

  it("keeps it with its supplier, a new one by name and the same one the next time", async () => {
    const ana = await anActor(db());
    const first = await receiveDelivery(db(), ana, aDeliveryForm());
    await receiveDelivery(db(), ana, aDeliveryForm({ newSupplier: "kestrel mill" }));
    if (!first.ok) throw new Error("refused");
    expect(await getDelivery(db(), ana, first.deliveryId)).toMatchObject({
      supplierName: "Kestrel Mill",
      receivedOn: "2027-03-01",
      claimedVolume: 200,
      priceMinor: 875,
      freightMinor: 5000,
      talliedAt: null,
      version: 1,
    });
    expect(await listSuppliers(db(), ana)).toMatchObject([{ deliveries: 2, lastReceivedOn: "2027-03-01" }]);
  });

  it("is refused with a supplier of another shop", async () => {
    const ana = await anActor(db());
    const elsewhere = await supplierNamed(db(), await anActor(db()), "Theirs");
    expect(await receiveDelivery(db(), ana, aDeliveryForm({ newSupplier: "", supplierId: elsewhere }))).toEqual({
      ok: false,
      why: "no such supplier",
    });
  });
});

describe("changing a delivery", () => {
  const db = useTestDb();

  it("the second of two saves is told who was first, and when; from the version told it goes through", async () => {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const ben = await anActor(db(), "maker", { name: "Ben", shopId: ana.shopId });
    const { id } = await aDelivery(db(), ana);
    expect(await changeDelivery(db(), ana, id, 1, aDeliveryForm({ grade: "FAS" }), now)).toEqual({ ok: true });
    const second = await changeDelivery(db(), ben, id, 1, aDeliveryForm({ grade: "Select" }), now);
    expect(second).toEqual({ ok: false, why: "changed", byName: "Ana", at: now, version: 2 });
    expect((await getDelivery(db(), ana, id))?.grade).toBe("FAS");
    expect(await changeDelivery(db(), ben, id, 2, aDeliveryForm({ grade: "Select" }), now)).toEqual({ ok: true });
  });

  it("of another shop finds nothing and changes nothing", async () => {
    const ana = await anActor(db());
    const { id } = await aDelivery(db(), ana);
    const stranger = await anActor(db());
    expect(await changeDelivery(db(), stranger, id, 1, aDeliveryForm({ grade: "X" }), now)).toMatchObject({
      why: "missing",
    });
    expect(await deleteDelivery(db(), stranger, id, now)).toMatchObject({ why: "missing" });
    expect(await shareCostAgain(db(), stranger, id)).toMatchObject({ why: "missing" });
    expect(await getDelivery(db(), stranger, id)).toBeNull();
    expect((await getDelivery(db(), ana, id))?.grade).toBe("");
  });

  it("a price that came after the tally is shared out when asked, with a line in each board's history and no money in it", async () => {
    const ana = await anActor(db());
    const { id } = await aDelivery(db(), ana, { priceMinor: null });
    await saveTally(db(), ana, id, [aTallyLine({ count: 3 })], now);
    expect(await shareCostAgain(db(), ana, id)).toEqual({ ok: false, why: "no price" });
    await changeDelivery(
      db(),
      ana,
      id,
      2,
      aDeliveryForm({ priceBasis: "lump", priceMinor: 100, freightMinor: 0 }),
      now,
    );
    expect(await shareCostAgain(db(), ana, id)).toEqual({ ok: true, boards: 3 });
    expect((await listLot(db(), ana, id)).map((board) => board.costMinor)).toEqual([34, 33, 33]);
    const events = await db()("board_events").where({ shop_id: ana.shopId, kind: "corrected" }).select("detail");
    expect(events).toHaveLength(3);
    expect(JSON.stringify(events)).not.toMatch(/3[34]/);
  });

  it("one logged by mistake goes off the list; once tallied it stays", async () => {
    const ana = await anActor(db(), "owner");
    const [mistake, tallied] = [await aDelivery(db(), ana), await aDelivery(db(), ana)];
    await saveTally(db(), ana, tallied.id, [aTallyLine()], now);
    expect(await deleteDelivery(db(), ana, mistake.id, now)).toEqual({ ok: true });
    expect(await deleteDelivery(db(), ana, tallied.id, now)).toEqual({ ok: false, why: "tallied" });
    expect(await getDelivery(db(), ana, mistake.id)).toBeNull();
    expect(await listDeliveries(db(), ana, filter())).toMatchObject({ total: 1, deliveries: [{ id: tallied.id }] });
  });
});

describe("the list of deliveries", () => {
  const db = useTestDb();

  it("stands those still to tally on top, then the newest; narrows, and never shows another shop's", async () => {
    const ana = await anActor(db());
    await aDelivery(db(), await anActor(db()));
    const done = await aDelivery(db(), ana, { receivedOn: "2027-05-01", reference: "100%_sure" });
    await saveTally(db(), ana, done.id, [aTallyLine({ count: 2 })], now);
    const old = await aDelivery(db(), ana, { receivedOn: "2026-01-01", species: "black-walnut" });
    const recent = await aDelivery(db(), ana, { receivedOn: "2027-04-01", newSupplier: "Other Yard" });
    const ids = async (search: string) =>
      (await listDeliveries(db(), ana, filter(search))).deliveries.map(({ id }) => id);
    expect(await ids("")).toEqual([recent.id, old.id, done.id]);
    expect(await ids("sort=oldest")).toEqual([old.id, recent.id, done.id]);
    expect(await ids("sort=supplier")).toEqual([done.id, old.id, recent.id]);
    expect(await ids("tally=done")).toEqual([done.id]);
    expect(await ids("tally=waiting&species=black-walnut")).toEqual([old.id]);
    expect(await ids("q=other+yard")).toEqual([recent.id]);
    expect(await ids("q=%25_")).toEqual([done.id]);
    expect(await ids("page=99")).toEqual([recent.id, old.id, done.id]);
    expect((await listDeliveries(db(), ana, filter("tally=done"))).deliveries[0]?.boards).toBe(2);
  });
});

describe("suppliers", () => {
  const db = useTestDb();

  it("cannot share a name within a shop, and can between shops", async () => {
    const ana = await anActor(db());
    expect(await addSupplier(db(), ana, supplier)).toEqual({ ok: true });
    expect(await addSupplier(db(), ana, { ...supplier, name: "KESTREL MILL" })).toMatchObject({ why: "name taken" });
    expect(await addSupplier(db(), await anActor(db()), supplier)).toEqual({ ok: true });
  });

  it("the second of two saves is told; another shop's is not there", async () => {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const id = await supplierNamed(db(), ana, "Kestrel Mill");
    expect(await changeSupplier(db(), ana, id, 1, { ...supplier, phone: "1" }, now)).toEqual({ ok: true });
    expect(await changeSupplier(db(), ana, id, 1, { ...supplier, phone: "2" }, now)).toEqual({
      ok: false,
      why: "changed",
      byName: "Ana",
      at: now,
      version: 2,
    });
    const stranger = await anActor(db());
    expect(await changeSupplier(db(), stranger, id, 2, supplier, now)).toMatchObject({ why: "missing" });
    expect((await getSupplier(db(), ana, id))?.phone).toBe("1");
  });
});
