import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { beginDocument, confirmDocument } from "#app/domain/deliveries/documents.server.ts";
import { saveTally } from "#app/domain/deliveries/tally.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import { can, type Permission, roles } from "#app/domain/shop/permissions.ts";
import { contextFor, statusFrom } from "#tests/factories/at-work.ts";
import { aDelivery, aTallyLine, deliveryFields } from "#tests/factories/delivery.ts";
import { anActor, aShop } from "#tests/factories/shop.ts";
import { sendTo, startTestStorage, type TestStorage } from "#tests/factories/storage.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { action as beginSending } from "../api/begin-document.ts";
import { action as confirmSending } from "../api/confirm-document.ts";
import { action as keepDraft, loader as lookAtDraft } from "../api/tally-draft.ts";
import { loader as downloadList } from "../files/deliveries-csv.ts";
import { loader as openDocument } from "../files/document.ts";
import { loader as seeSuppliers } from "../suppliers/list.tsx";
import { action as addSupplier, loader as formOfSupplier } from "../suppliers/new.tsx";
import { action as changeSupplier, loader as seeSupplier } from "../suppliers/supplier.tsx";
import { loader as askDelete, action as doDelete } from "./delete.tsx";
import { loader as seeDelivery, action as shareCost } from "./delivery.tsx";
import { action as change, loader as formOfChange } from "./edit.tsx";
import { loader as seeList } from "./list.tsx";
import { loader as formOfLog, action as log } from "./new.tsx";
import { loader as askRemove, action as removePaper } from "./remove-document.tsx";
import { loader as openTally, action as save } from "./tally.tsx";

const now = new Date("2027-03-01T09:00:00Z");
const pdf = Buffer.from("%PDF-1.4\nstartxref\n9\n%%EOF\n");

type Handler = (args: never) => unknown;

interface Ask {
  handler: Handler;
  needs: Permission;
  /** Has it a record in its address that another shop's person must not find? */
  names: "delivery" | "document" | "supplier" | null;
  form?: Record<string, string>;
  json?: unknown;
}

const draft = { rows: [], version: 0, writer: "phone", after: null };
const paper = { name: "a.pdf", bytes: 9, contentType: "application/pdf" };

/** Every address of deliveries and suppliers, with what one must be allowed to. */
const asks: Record<string, Ask> = {
  "GET /deliveries": { handler: seeList, needs: "delivery:see", names: null },
  "GET /files/deliveries.csv": { handler: downloadList, needs: "delivery:see", names: null },
  "GET /deliveries/new": { handler: formOfLog, needs: "delivery:receive", names: null },
  "POST /deliveries/new": { handler: log, needs: "delivery:receive", names: null, form: deliveryFields },
  "GET /deliveries/:id": { handler: seeDelivery, needs: "delivery:see", names: "delivery" },
  "POST /deliveries/:id": { handler: shareCost, needs: "delivery:receive", names: "delivery", form: {} },
  "GET …/edit": { handler: formOfChange, needs: "delivery:receive", names: "delivery" },
  "POST …/edit": {
    handler: change,
    needs: "delivery:receive",
    names: "delivery",
    form: { ...deliveryFields, version: "1" },
  },
  "GET …/tally": { handler: openTally, needs: "delivery:tally", names: "delivery" },
  "POST …/tally": { handler: save, needs: "delivery:tally", names: "delivery", form: { lines: "8 x 10'" } },
  "GET …/delete": { handler: askDelete, needs: "delivery:delete", names: "delivery" },
  "POST …/delete": { handler: doDelete, needs: "delivery:delete", names: "delivery", form: {} },
  "GET …/tally-draft": { handler: lookAtDraft, needs: "delivery:tally", names: "delivery" },
  "POST …/tally-draft": { handler: keepDraft, needs: "delivery:tally", names: "delivery", json: draft },
  "POST …/documents": { handler: beginSending, needs: "delivery:receive", names: "delivery", json: paper },
  "POST …/confirm": { handler: confirmSending, needs: "delivery:receive", names: "document", json: {} },
  "GET /files/documents/:id": { handler: openDocument, needs: "delivery:see", names: "document" },
  "GET …/remove": { handler: askRemove, needs: "delivery:receive", names: "document" },
  "POST …/remove": { handler: removePaper, needs: "delivery:receive", names: "document", form: {} },
  "GET /suppliers": { handler: seeSuppliers, needs: "supplier:see", names: null },
  "GET /suppliers/new": { handler: formOfSupplier, needs: "supplier:change", names: null },
  "POST /suppliers/new": { handler: addSupplier, needs: "supplier:change", names: null, form: { name: "New Yard" } },
  "GET /suppliers/:id": { handler: seeSupplier, needs: "supplier:change", names: "supplier" },
  "POST /suppliers/:id": {
    handler: changeSupplier,
    needs: "supplier:change",
    names: "supplier",
    form: { name: "Yard", version: "1" },
  },
};

describe("deliveries and suppliers, asked for by their addresses", () => {
  const db = useTestDb();
  let store: TestStorage;
  beforeAll(async () => {
    store = await startTestStorage();
  });
  afterAll(() => store.stop());

  async function scene() {
    const shopId = await aShop(db());
    const owner = await anActor(db(), "owner", { shopId, name: "Ana" });
    const { id: deliveryId } = await aDelivery(db(), owner);
    const begun = await beginDocument(db(), store.storage, owner, { ...paper, deliveryId }, now);
    if (!begun) throw new Error("no delivery");
    await sendTo(begun.put, pdf);
    await confirmDocument(db(), store.storage, owner, begun.id);
    const { supplier_id: supplierId } = await db()("deliveries").where({ id: deliveryId }).first("supplier_id");
    return { shopId, owner, params: { deliveryId, documentId: begun.id, supplierId } };
  }
  type Params = Awaited<ReturnType<typeof scene>>["params"];

  async function ask(actor: Actor, { handler, form, json }: Ask, params: Params, search = "") {
    const url = new URL(`http://rack.example/x${search}`);
    const body = form ? new URLSearchParams(form) : json ? JSON.stringify(json) : undefined;
    const request = new Request(url, body === undefined ? {} : { method: "POST", body });
    const context = await contextFor(db(), actor, store.storage);
    return (handler as (args: unknown) => unknown)({ request, params, context, url });
  }
  const statusOf = (actor: Actor, asked: Ask, params: Params) => statusFrom(() => ask(actor, asked, params));

  it.each(Object.entries(asks))("%s lets in those of its role, and nobody else", async (_, asked) => {
    for (const role of roles) {
      const { shopId, params } = await scene();
      const status = await statusOf(await anActor(db(), role, { shopId }), asked, params);
      if (can(role, asked.needs)) expect([200, 302]).toContain(status);
      else expect(status).toBe(403);
    }
  });

  it.each(Object.entries(asks).filter(([, { names }]) => names !== null))(
    "%s of another shop is not there",
    async (_, asked) => {
      const { params } = await scene();
      const stranger = await anActor(db(), "owner");
      expect(await statusOf(stranger, asked, params)).toBe(404);
    },
  );

  it("a delivery with another shop's supplier is refused beside the field", async () => {
    const { owner, params } = await scene();
    const stranger = await anActor(db(), "owner");
    const form = { ...deliveryFields, newSupplier: "", supplierId: params.supplierId };
    const asked = { ...asks["POST /deliveries/new"], form } as Ask;
    expect(await statusOf(stranger, asked, params)).toBe(400);
    expect(await statusOf(owner, asked, params)).toBe(302);
  });

  it("a second save of one delivery is a conflict that names who was first", async () => {
    const { owner, shopId, params } = await scene();
    const ben = await anActor(db(), "maker", { shopId, name: "Ben" });
    const edit = asks["POST …/edit"] as Ask;
    expect(await statusOf(ben, edit, params)).toBe(302);
    expect(await ask(owner, edit, params)).toMatchObject({
      init: { status: 409 },
      data: { stale: { byName: "Ben", version: 2 } },
    });
  });

  it("a tally with a line that cannot be read keeps what was typed and makes no board", async () => {
    const { owner, params } = await scene();
    const asked = { ...asks["POST …/tally"], form: { lines: "8 x 10'\nhello" } } as Ask;
    expect(await ask(owner, asked, params)).toMatchObject({
      init: { status: 400 },
      data: {
        lines: "8 x 10'\nhello",
        problems: [
          { lineNumber: 2, field: "width" },
          { lineNumber: 2, field: "length" },
        ],
      },
    });
    expect(await db()("boards").where({ delivery_id: params.deliveryId })).toEqual([]);
  });

  it.each(["[]", "{}", "not json", "[{}]", '[{"count":1}]'])(
    "rows posted as %s make no board and no 500",
    async (rows) => {
      const { owner, params } = await scene();
      expect(await statusOf(owner, { ...asks["POST …/tally"], form: { rows } } as Ask, params)).toBe(400);
    },
  );

  it("a tally saved twice is a conflict", async () => {
    const { owner, params } = await scene();
    await saveTally(db(), owner, params.deliveryId, [aTallyLine()], now);
    expect(await statusOf(owner, asks["POST …/tally"] as Ask, params)).toBe(409);
  });

  it("a draft that another page was quicker with is a conflict with the newer one in it", async () => {
    const { owner, params } = await scene();
    const keep = asks["POST …/tally-draft"] as Ask;
    expect(await statusOf(owner, keep, params)).toBe(200);
    expect(await ask(owner, keep, params)).toMatchObject({
      init: { status: 409 },
      data: { kept: false, why: "newer", draft: { version: 1, byName: "Ana" } },
    });
    expect(await statusOf(owner, { ...keep, json: { rows: "all" } }, params)).toBe(400);
  });

  it("a PDF is handed over as a file that no browser runs", async () => {
    const { owner, params } = await scene();
    const answer = (await ask(owner, asks["GET /files/documents/:id"] as Ask, params)) as Response;
    expect(answer.headers.get("Content-Type")).toBe("application/pdf");
    expect(answer.headers.get("Content-Disposition")).toMatch(/^attachment; filename="a\.pdf"/);
    expect(answer.headers.get("X-Content-Type-Options")).toBe("nosniff");
    expect(answer.headers.get("Content-Security-Policy")).toMatch(/sandbox$/);
    expect(Buffer.from(await answer.arrayBuffer())).toEqual(pdf);
  });

  it.each(["?page=-1&sort=nothing&tally=x", "?page=999999999", "?q=%00%25_%27%22\\"])(
    "the list at %s falls back",
    async (search) => {
      const { owner, params } = await scene();
      expect(await ask(owner, asks["GET /deliveries"] as Ask, params, search)).toMatchObject({ pages: 1 });
    },
  );
});
