import { describe, expect, test } from "vitest";
import { type AskedRoute, asked } from "#tests/factories/asked-routes.ts";
import type { FurnishedShop } from "#tests/factories/furnished-shop.ts";
import { useTwoShops } from "#tests/factories/two-shops.ts";

const scene = useTwoShops();

/** Routes whose address names a record. */
const named = Object.entries(asked)
  .map(([file, route]) => ({ file, route }))
  .filter(({ route }) => route.at(namesOf("x")) !== route.at(namesOf("y")));

/** A shop of which every record has the same name. */
function namesOf(name: string): FurnishedShop {
  return new Proxy({} as FurnishedShop, { get: () => name });
}

/** Asks at an address with a page's own form, as the owner: whoever may most. */
async function statuses(route: AskedRoute, path: string): Promise<number[]> {
  const { app, cookies, shop } = scene;
  const answers = [];
  if (route.get) answers.push(await app.get(path, cookies.owner));
  if (route.post) answers.push(await app.post(path, cookies.owner, route.form?.(shop) ?? {}));
  return answers.map(({ status }) => status);
}

describe("a record of another shop is not there", () => {
  // What a list is asked for by name is left out of it; that is tested beside the lists.
  const addressed = named.filter(({ file }) => !["routes/tags/tags.tsx", "routes/files/tags-pdf.ts"].includes(file));

  test.each(addressed)("for $file", async ({ route }) => {
    const before = await scene.written();
    for (const status of await statuses(route, route.at(scene.other))) expect(status).toBe(404);
    expect(await scene.written()).toBe(before);
  });

  test("nor on a page of tags, alone or beside our own", async () => {
    const { app, cookies, shop, other } = scene;
    expect((await app.get(`/files/tags.pdf?board=${other.boardId}`, cookies.owner)).status).toBe(404);
    const { body } = await app.get(`/tags?board=${other.boardId}&board=${shop.boardId}`, cookies.owner);
    const { boards } = JSON.parse(body).loaderData["routes/tags/tags.tsx"];
    expect(boards.map((board: { id: string }) => board.id)).toEqual([shop.boardId]);
  });

  test.each([
    ["a photo, on our board", (own, other) => `/boards/${own.boardId}/rings/${other.photoId}`, { marks: "{}" }],
    ["a board, with our photo", (own, other) => `/boards/${other.boardId}/rings/${own.photoId}`, { marks: "{}" }],
    ["our photo, on another board", (own) => `/boards/${own.spareBoardId}/rings/${own.photoId}`, { marks: "{}" }],
    ["a photo, off our board", (own, other) => `/boards/${own.boardId}/photos/${other.photoId}/remove`, {}],
    ["our photo, off their board", (own, other) => `/boards/${other.boardId}/photos/${own.photoId}/remove`, {}],
    ["our photo, off another board", (own) => `/boards/${own.spareBoardId}/photos/${own.photoId}/remove`, {}],
    [
      "a paper, off our delivery",
      (own, other) => `/deliveries/${own.deliveryId}/documents/${other.documentId}/remove`,
      {},
    ],
    ["our paper, off another delivery", (own) => `/deliveries/${own.talliedId}/documents/${own.documentId}/remove`, {}],
    ["a defect, off our board", (own) => `/boards/${own.boardId}/defects`, (_, other) => ({ remove: other.defectId })],
    [
      "our defect, off another board",
      (own) => `/boards/${own.spareBoardId}/defects`,
      (own) => ({ remove: own.defectId }),
    ],
    ["a part, off our project", (own) => `/projects/${own.projectId}/parts`, (_, other) => ({ remove: other.partId })],
    ["an arm, to lay our board on", (own) => `/boards/${own.boardId}/move`, (_, other) => ({ armId: other.armId })],
    [
      "a project, to reserve for",
      (own) => `/boards/${own.boardId}/reserve`,
      (_, other) => ({
        projectId: other.projectId,
        part: "far",
        lengthMm: "5",
        until: new Date(Date.now() + 86_400_000).toISOString().slice(0, 10),
      }),
    ],
    [
      "a person, to give a role",
      () => "/people",
      (_, other) => ({ intent: "role", personId: other.colleagueId, role: "owner" }),
    ],
    ["a person, to part ways with", () => "/people", (_, other) => ({ intent: "remove", personId: other.colleagueId })],
    ["an invitation", () => "/people", (_, other) => ({ intent: "revoke", invitationId: other.invitationId })],
    ["a shop one is not in", () => "/shops", (_, other) => ({ shopId: other.shopId })],
  ] satisfies [
    string,
    (own: FurnishedShop, other: FurnishedShop) => string,
    Record<string, string> | ((own: FurnishedShop, other: FurnishedShop) => Record<string, string>),
  ][])("%s", async (_, at, form) => {
    const { app, cookies, shop, other } = scene;
    const before = await scene.written();
    const sent = typeof form === "function" ? form(shop, other) : form;
    expect((await app.post(at(shop, other), cookies.owner, sent)).status).toBe(404);
    expect(await scene.written()).toBe(before);
  });

  test("a supplier of theirs cannot have delivered to us", async () => {
    const { app, cookies, shop, other } = scene;
    const form = {
      receivedOn: "2027-02-03",
      species: "white-oak",
      quarters: "4",
      supplierId: other.supplierId,
      version: "1",
    };
    const before = await scene.written();
    expect((await app.post("/deliveries/new", cookies.owner, form)).status).toBe(400);
    expect((await app.post(`/deliveries/${shop.deliveryId}/edit`, cookies.owner, form)).status).toBe(400);
    expect(await scene.written()).toBe(before);
  });
});

describe("a plan of another shop's boards", () => {
  test("holds nothing, here or there", async () => {
    const { app, cookies, shop, other } = scene;
    const whole = (boardId: string) => ({ boardId, fromMm: 0, toMm: 500 });
    const stretches = JSON.stringify([whole(shop.spareBoardId), whole(other.spareBoardId)]);
    const before = await scene.written();
    const { status, body } = await app.post(`/projects/${shop.projectId}/plan`, cookies.owner, { stretches });
    expect(status).toBe(409);
    expect(JSON.parse(body).actionData).toEqual({ "routes/projects/plan.tsx": { changed: [] } });
    expect(await scene.written()).toBe(before);
  });
});

describe("what cannot be an identifier is not there either", () => {
  const odd = ["☃", "é".repeat(13), "x", "A".repeat(13), "%00", "%25", "' OR 1=1 --", "1".repeat(3000)];
  const addressed = named.filter(({ file }) => !["routes/tags/tags.tsx", "routes/files/tags-pdf.ts"].includes(file));

  test.each(addressed)("for $file", async ({ route }) => {
    for (const name of odd) {
      const path = route.at(namesOf(name.includes("%") ? name : encodeURIComponent(name)));
      for (const status of await statuses(route, path)) expect({ name, status }).toEqual({ name, status: 404 });
    }
  });

  test("for tags: none to show, no file to print", async () => {
    const { app, cookies } = scene;
    for (const name of odd.map(encodeURIComponent)) {
      expect((await app.get(`/tags?board=${name}`, cookies.owner)).status).toBe(200);
      expect([200, 404]).toContain((await app.get(`/files/tags.pdf?board=${name}`, cookies.owner)).status);
    }
  });
});
