import { describe, expect, it } from "vitest";
import { aDelivery, aTallyLine } from "#tests/factories/delivery.ts";
import { anActor } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { saveTally } from "./tally.server.ts";
import { keepTallyDraft, readTallyDraft } from "./tally-draft.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const row = (width: string) => ({ count: "", width, length: "8'", quarters: "4", species: "white-oak" });
const draft = (width: string, version: number, writer: string) => ({
  rows: [row(width)],
  version,
  writer,
  after: null,
});

describe("a half-typed tally on the server", () => {
  const db = useTestDb();

  it("comes back as it was typed, with who kept it and when", async () => {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const { id } = await aDelivery(db(), ana);
    expect((await readTallyDraft(db(), ana, id))?.draft).toMatchObject({ rows: [], version: 0, at: null });
    expect(await keepTallyDraft(db(), ana, id, draft("8 1/", 0, "phone"), now)).toEqual({ kept: true, version: 1 });
    expect((await readTallyDraft(db(), ana, id))?.draft).toEqual({
      rows: [row("8 1/")],
      version: 1,
      writer: "phone",
      byName: "Ana",
      at: now.toISOString(),
    });
  });

  it("of a second device is refused and the newer one comes back; nothing is overwritten", async () => {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const ben = await anActor(db(), "maker", { name: "Ben", shopId: ana.shopId });
    const { id } = await aDelivery(db(), ana);
    await keepTallyDraft(db(), ana, id, draft("8", 0, "phone"), now);
    expect(await keepTallyDraft(db(), ben, id, draft("7", 0, "desk"), now)).toMatchObject({
      kept: false,
      why: "newer",
      draft: { rows: [row("8")], version: 1, byName: "Ana" },
    });
    expect(await keepTallyDraft(db(), ben, id, draft("7", 1, "desk"), now)).toEqual({ kept: true, version: 2 });
  });

  it("is gone once the delivery is tallied, and no later one is kept for that tally", async () => {
    const ana = await anActor(db());
    const { id } = await aDelivery(db(), ana);
    await keepTallyDraft(db(), ana, id, draft("8", 0, "phone"), now);
    await saveTally(db(), ana, id, [aTallyLine()], now);
    expect(await readTallyDraft(db(), ana, id)).toMatchObject({ talliedAt: now, draft: { rows: [] } });
    expect(await keepTallyDraft(db(), ana, id, draft("7", 1, "phone"), now)).toEqual({ kept: false, why: "tallied" });
    // Boards that were missed are typed after the tally, and say so.
    const more = { ...draft("7", 1, "phone"), after: now };
    expect(await keepTallyDraft(db(), ana, id, more, now)).toEqual({ kept: true, version: 2 });
  });

  it("of another shop is not there, to read or to write", async () => {
    const ana = await anActor(db());
    const { id } = await aDelivery(db(), ana);
    const stranger = await anActor(db());
    expect(await readTallyDraft(db(), stranger, id)).toBeNull();
    expect(await keepTallyDraft(db(), stranger, id, draft("8", 0, "x"), now)).toBeNull();
    expect((await readTallyDraft(db(), ana, id))?.draft.version).toBe(0);
  });
});
