import { afterAll, beforeAll, describe, expect, test } from "vitest";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Storage } from "#app/services/storage.server.ts";
import { aBoard } from "#tests/factories/board.ts";
import { aPicture, claimedAvif, hiddenWord, hugePng, hugeWebp, pictureFormats } from "#tests/factories/pictures.ts";
import { anActor } from "#tests/factories/shop.ts";
import { sendTo, startTestStorage, type TestStorage } from "#tests/factories/storage.ts";
import { type FreshDatabase, freshDatabase } from "#tests/setup/test-db.ts";
import { mostPhotoBytes, type PhotoRefusal } from "./photo.ts";
import { beginPhoto, confirmPhoto, removePhoto } from "./photos.server.ts";
import { getPhoto, listPhotos, photoKey } from "./photos.sql.server.ts";

const now = new Date();
let fresh: FreshDatabase;
let files: TestStorage;
let ana: Actor;
let board: { id: string };

beforeAll(async () => {
  [fresh, files] = await Promise.all([freshDatabase(), startTestStorage()]);
  ana = await anActor(fresh.db);
  board = await aBoard(fresh.db, ana);
});
afterAll(() => Promise.all([fresh.drop(), files.stop()]));

async function announced(bytes = 1000, contentType = "image/jpeg") {
  const photo = { boardId: board.id, kind: "near end", bytes, contentType } as const;
  const begun = await beginPhoto(fresh.db, files.storage, ana, photo, now);
  if (!begun) throw new Error("not begun");
  return begun;
}

/** A photo that has been sent, not confirmed. */
async function sent(bytes: Uint8Array, contentType = "image/jpeg") {
  const begun = await announced(bytes.length, contentType);
  await sendTo(begun.put, bytes);
  return begun;
}

const confirm = (id: string, storage: Storage = files.storage, by = ana) => confirmPhoto(fresh.db, storage, by, id);
const rows = (id: string) => fresh.db("photos").where({ id });
const events = () => fresh.db("board_events").where({ board_id: board.id, kind: "photographed" });

/** Runs something and says by how many files, rows and lines of history there are more. */
async function change(run: () => Promise<unknown>) {
  const count = async () => ({
    files: await files.count(),
    rows: Number((await fresh.db("photos").count({ n: "*" }).first())?.n),
    events: (await events()).length,
  });
  const before = await count();
  await run();
  const after = await count();
  return { files: after.files - before.files, rows: after.rows - before.rows, events: after.events - before.events };
}

async function kept(id: string, size: "original" | "screen" | "small"): Promise<Buffer> {
  const key = await photoKey(fresh.db, ana, id, size);
  const bytes = key && (await files.storage.read(key, mostPhotoBytes));
  if (!bytes) throw new Error("not kept");
  return Buffer.from(bytes);
}

describe("a photo that was sent", () => {
  test.each(pictureFormats)("as %s is kept in three sizes, without the place it was taken", async (format) => {
    const begun = await sent(await aPicture({ format, widthPx: 640, heightPx: 400 }), `image/${format}`);
    const grown = await change(async () =>
      expect(await confirm(begun.id)).toEqual({ ok: true, photoId: begun.id, boardId: board.id }),
    );
    // What was sent is gone; original, screen and small are there.
    expect(grown).toEqual({ files: 2, rows: 0, events: 1 });
    for (const size of ["original", "screen", "small"] as const)
      expect((await kept(begun.id, size)).includes(hiddenWord)).toBe(false);
    expect(await getPhoto(fresh.db, ana, begun.id)).toMatchObject({ widthPx: 640, heightPx: 400, boardId: board.id });
  });

  test("shows nowhere until it is confirmed", async () => {
    const begun = await sent(await aPicture());
    expect((await listPhotos(fresh.db, ana, board.id)).map((photo) => photo.id)).not.toContain(begun.id);
    expect(await photoKey(fresh.db, ana, begun.id, "original")).toBeNull();
    await confirm(begun.id);
    expect((await listPhotos(fresh.db, ana, board.id)).map((photo) => photo.id)).toContain(begun.id);
  });

  test("and sent again after it was confirmed shows what was confirmed", async () => {
    const begun = await sent(await aPicture());
    await confirm(begun.id);
    const before = await Promise.all((["original", "screen", "small"] as const).map((size) => kept(begun.id, size)));
    await sendTo(begun.put, Buffer.from("<script>alert(1)</script>"));
    expect(await confirm(begun.id)).toMatchObject({ ok: true });
    const after = await Promise.all((["original", "screen", "small"] as const).map((size) => kept(begun.id, size)));
    expect(after).toEqual(before);
  });
});

const refused: [string, PhotoRefusal, () => Buffer | Promise<Buffer>][] = [
  ["text", "wrong type", () => Buffer.from("not a picture")],
  ["an SVG", "wrong type", () => Buffer.from(`<svg xmlns="http://www.w3.org/2000/svg"/>`)],
  ["a PDF that is called a JPEG", "wrong type", () => Buffer.from("%PDF-1.7\n%%EOF")],
  ["a JPEG cut short", "broken", async () => (await aPicture({ widthPx: 640 })).subarray(0, -300)],
  ["a WebP cut short", "broken", async () => (await aPicture({ format: "webp" })).subarray(0, -40)],
  ["a PNG of 20,000 by 20,000", "too many pixels", () => hugePng(20_000, 20_000)],
  ["a WebP of 16,383 by 16,383", "too many pixels", hugeWebp],
  ["an AVIF of 20,000 by 20,000", "too many pixels", () => claimedAvif(20_000)],
  ["a file over 25 MB", "too large", () => Buffer.alloc(mostPhotoBytes + 1, 0xff)],
];

describe("a refused photo leaves nothing behind:", () => {
  test.each(refused)("%s", async (_, why, make) => {
    const bytes = await make();
    const grown = await change(async () => {
      const begun = await sent(bytes);
      expect(await confirm(begun.id)).toEqual({ ok: false, why });
      expect(await rows(begun.id)).toEqual([]);
      expect(await confirm(begun.id)).toEqual({ ok: false, why: "missing" });
    });
    expect(grown).toEqual({ files: 0, rows: 0, events: 0 });
  });

  test("one that the file store would not keep, in any of its sizes", async () => {
    const begun = await sent(await aPicture());
    let puts = 0;
    const failing: Storage = {
      ...files.storage,
      put: (...args) => (++puts === 2 ? Promise.reject(new Error("disk full")) : files.storage.put(...args)),
    };
    const grown = await change(() => expect(confirm(begun.id, failing)).rejects.toThrow("disk full"));
    expect(grown).toEqual({ files: 0, rows: 0, events: 0 });
    expect(await confirm(begun.id)).toMatchObject({ ok: true });
  });
});

describe("a photo that has not arrived", () => {
  test("can be sent and confirmed again", async () => {
    const begun = await announced();
    expect(await confirm(begun.id)).toEqual({ ok: false, why: "not arrived" });
    await sendTo(begun.put, await aPicture());
    expect(await confirm(begun.id)).toMatchObject({ ok: true });
  });

  test("is swept a day later, with its file, when the next is announced", async () => {
    const forgotten = await sent(await aPicture());
    await fresh
      .db("photos")
      .where({ id: forgotten.id })
      .update({ created_at: new Date(now.getTime() - 25 * 3_600_000) });
    expect(await change(() => announced())).toEqual({ files: -1, rows: 0, events: 0 });
    expect(await rows(forgotten.id)).toEqual([]);
  });
});

describe("pressed twice", () => {
  test("at once, through two processes: one photo, no files too many, and both are told that it is in", async () => {
    const begun = await sent(await aPicture({ widthPx: 640, heightPx: 400 }));
    const other = fresh.open();
    const grown = await change(async () => {
      const answers = await Promise.all([
        confirm(begun.id),
        confirmPhoto(other, files.storage, ana, begun.id),
        confirm(begun.id),
        confirmPhoto(other, files.storage, ana, begun.id),
      ]);
      for (const answer of answers) expect(answer).toEqual({ ok: true, photoId: begun.id, boardId: board.id });
    });
    expect(grown).toEqual({ files: 2, rows: 0, events: 1 });
  });

  test("again after the answer was lost: told that it is in", async () => {
    const begun = await sent(await aPicture());
    const first = await confirm(begun.id);
    expect(await change(async () => expect(await confirm(begun.id)).toEqual(first))).toEqual({
      files: 0,
      rows: 0,
      events: 0,
    });
  });

  test("with another file put in between: never a yes without a photo", async () => {
    const begun = await sent(await aPicture());
    // The first press has read the picture; before it is done, something else is sent and confirmed.
    const meddled: Storage = {
      ...files.storage,
      async put(...args) {
        await sendTo(begun.put, Buffer.from("no picture"));
        await confirm(begun.id);
        return files.storage.put(...args);
      },
    };
    const answer = await confirm(begun.id, meddled);
    expect(answer.ok).toBe((await getPhoto(fresh.db, ana, begun.id)) !== null);
    expect(await rows(begun.id)).toHaveLength(answer.ok ? 1 : 0);
  });
});

describe("of another shop", () => {
  test("a photo cannot be announced, confirmed, seen or removed", async () => {
    const stranger = await anActor(fresh.db, "owner");
    const photo = { boardId: board.id, kind: "edge", bytes: 10, contentType: "image/jpeg" } as const;
    expect(await beginPhoto(fresh.db, files.storage, stranger, photo, now)).toBeNull();
    const begun = await sent(await aPicture());
    expect(await confirm(begun.id, files.storage, stranger)).toEqual({ ok: false, why: "missing" });
    await confirm(begun.id);
    expect(await confirm(begun.id, files.storage, stranger)).toEqual({ ok: false, why: "missing" });
    expect(await photoKey(fresh.db, stranger, begun.id, "small")).toBeNull();
    expect(await removePhoto(fresh.db, files.storage, stranger, board.id, begun.id)).toBe(false);
    expect(await photoKey(fresh.db, ana, begun.id, "small")).not.toBeNull();
  });

  test("nor one of a deleted board", async () => {
    const begun = await sent(await aPicture());
    await confirm(begun.id);
    const waiting = await sent(await aPicture());
    await fresh.db("boards").where({ id: board.id }).update({ deleted_at: now });
    expect(await photoKey(fresh.db, ana, begun.id, "small")).toBeNull();
    expect(await confirm(waiting.id)).toEqual({ ok: false, why: "missing" });
    expect(await removePhoto(fresh.db, files.storage, ana, board.id, begun.id)).toBe(false);
    await fresh.db("boards").where({ id: board.id }).update({ deleted_at: null });
  });
});

describe("removing", () => {
  test("takes all three files; two people at once write one line of history", async () => {
    const begun = await sent(await aPicture());
    await confirm(begun.id);
    const removed = () => fresh.db("board_events").where({ board_id: board.id, kind: "photo removed" });
    const before = (await removed()).length;
    const other = fresh.open();
    const grown = await change(async () => {
      const answers = await Promise.all(
        [fresh.db, other, fresh.db, other].map((db) => removePhoto(db, files.storage, ana, board.id, begun.id)),
      );
      expect(answers.filter(Boolean)).toHaveLength(1);
    });
    expect(grown).toEqual({ files: -3, rows: -1, events: 0 });
    expect(await removed()).toHaveLength(before + 1);
  });

  test("by the address of another board removes nothing", async () => {
    const begun = await sent(await aPicture());
    await confirm(begun.id);
    const another = await aBoard(fresh.db, ana);
    expect(await removePhoto(fresh.db, files.storage, ana, another.id, begun.id)).toBe(false);
    expect(await getPhoto(fresh.db, ana, begun.id)).not.toBeNull();
  });
});
