import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { aDelivery } from "#tests/factories/delivery.ts";
import { aPicture, hiddenWord, hugePng } from "#tests/factories/pictures.ts";
import { anActor } from "#tests/factories/shop.ts";
import { sendTo, startTestStorage, type TestStorage } from "#tests/factories/storage.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { beginDocument, confirmDocument, removeDocument } from "./documents.server.ts";
import { getDocument, listDocuments } from "./documents.sql.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const pdf = Buffer.from("%PDF-1.4\n1 0 obj<<>>endobj\ntrailer<<>>\nstartxref\n9\n%%EOF\n");

describe("papers of a delivery", () => {
  const db = useTestDb();
  let store: TestStorage;
  beforeAll(async () => {
    store = await startTestStorage();
  });
  afterAll(() => store.stop());

  async function scene() {
    const ana = await anActor(db(), "maker", { name: "Ana" });
    const { id: deliveryId } = await aDelivery(db(), ana);
    const { storage } = store;
    async function send(bytes: Uint8Array, name = "invoice.pdf") {
      const file = { deliveryId, name, bytes: bytes.byteLength, contentType: "application/pdf" };
      const begun = await beginDocument(db(), storage, ana, file, now);
      if (!begun) throw new Error("no delivery");
      await sendTo(begun.put, bytes);
      return { id: begun.id, result: await confirmDocument(db(), storage, ana, begun.id) };
    }
    return { ana, deliveryId, storage, send };
  }

  it("a PDF is kept byte for byte, and listed with who sent it", async () => {
    const { ana, deliveryId, storage, send } = await scene();
    const { id, result } = await send(pdf, "C:\\scans\\Invoice 12.PDF");
    expect(result).toEqual({ ok: true });
    expect(await listDocuments(db(), ana, deliveryId)).toMatchObject([
      { name: "Invoice 12.pdf", contentType: "application/pdf", bytes: pdf.byteLength, addedBy: "Ana" },
    ]);
    const kept = await getDocument(db(), ana, id, "ready");
    expect(Buffer.from((await storage.read(kept?.objectKey ?? "", 1e6)) ?? [])).toEqual(pdf);
  });

  it("a picture is known by its bytes whatever it is called, and says no more where it was taken", async () => {
    const { ana, storage, send } = await scene();
    const { id, result } = await send(await aPicture(), "invoice.pdf");
    expect(result).toEqual({ ok: true });
    const kept = await getDocument(db(), ana, id, "ready");
    expect(kept).toMatchObject({ name: "invoice.jpg", contentType: "image/jpeg" });
    const bytes = Buffer.from((await storage.read(kept?.objectKey ?? "", 1e6)) ?? []);
    expect(bytes.includes(hiddenWord)).toBe(false);
  });

  it.each<[string, () => Buffer | Promise<Buffer>, string]>([
    ["a page that says it is a PDF", () => Buffer.from("<script>alert(1)</script>"), "wrong type"],
    ["a PDF cut short", () => pdf.subarray(0, 30), "broken"],
    ["a PDF whose end is not at its end", () => Buffer.concat([pdf, Buffer.alloc(2048, 32)]), "broken"],
    ["a picture cut short", async () => (await aPicture()).subarray(0, 600), "broken"],
    ["a picture of 400 megapixels", () => hugePng(20_000, 20_000), "too many pixels"],
    ["a file of 26 MB", () => Buffer.alloc(26 * 1024 * 1024), "too large"],
  ])("%s is refused and leaves nothing", async (_, make, why) => {
    const { ana, deliveryId, send } = await scene();
    const before = await store.count();
    const { id, result } = await send(await make());
    expect(result).toEqual({ ok: false, why });
    expect(await store.count()).toBe(before);
    expect(await getDocument(db(), ana, id, "waiting")).toBeNull();
    expect(await listDocuments(db(), ana, deliveryId)).toEqual([]);
  });

  it("one that has not arrived may still come", async () => {
    const { ana, deliveryId, storage } = await scene();
    const file = { deliveryId, name: "a.pdf", bytes: pdf.byteLength, contentType: "application/pdf" };
    const begun = await beginDocument(db(), storage, ana, file, now);
    if (!begun) throw new Error("no delivery");
    expect(await confirmDocument(db(), storage, ana, begun.id)).toEqual({ ok: false, why: "not arrived" });
    await sendTo(begun.put, pdf);
    expect(await confirmDocument(db(), storage, ana, begun.id)).toEqual({ ok: true });
  });

  it("confirmed twice it is taken in once, and both are told so", async () => {
    const { ana, deliveryId, storage, send } = await scene();
    const { id } = await send(pdf);
    expect(await confirmDocument(db(), storage, ana, id)).toEqual({ ok: true });
    expect(await listDocuments(db(), ana, deliveryId)).toHaveLength(1);
  });

  it("one announced a day ago and never sent is swept", async () => {
    const { ana, deliveryId, storage } = await scene();
    const file = { deliveryId, name: "a.pdf", bytes: 9, contentType: "application/pdf" };
    const old = await beginDocument(db(), storage, ana, file, now);
    await db()("delivery_documents").update({ created_at: new Date("2027-02-27") });
    await beginDocument(db(), storage, ana, file, now);
    expect(await getDocument(db(), ana, old?.id ?? "", "waiting")).toBeNull();
  });

  it("of another shop can be neither sent, confirmed, read nor removed", async () => {
    const { ana, deliveryId, storage, send } = await scene();
    const { id } = await send(pdf);
    const stranger = await anActor(db());
    const file = { deliveryId, name: "a.pdf", bytes: 9, contentType: "application/pdf" };
    expect(await beginDocument(db(), storage, stranger, file, now)).toBeNull();
    expect(await confirmDocument(db(), storage, stranger, id)).toEqual({ ok: false, why: "missing" });
    expect(await getDocument(db(), stranger, id, "ready")).toBeNull();
    expect(await removeDocument(db(), storage, stranger, id)).toBeNull();
    expect(await listDocuments(db(), ana, deliveryId)).toHaveLength(1);
  });

  it("goes with its file when it is removed", async () => {
    const { ana, deliveryId, storage, send } = await scene();
    const before = await store.count();
    const { id } = await send(pdf);
    expect(await removeDocument(db(), storage, ana, id)).toEqual({ deliveryId });
    expect(await store.count()).toBe(before);
  });
});
