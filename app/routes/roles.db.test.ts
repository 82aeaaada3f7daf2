import { describe, expect, test } from "vitest";
import { can, roles } from "#app/domain/shop/permissions.ts";
import { asked, ofNoShop } from "#tests/factories/asked-routes.ts";
import { secretMoney } from "#tests/factories/furnished-shop.ts";
import { filesWithHandlers, listRoutes } from "#tests/factories/shop-app.ts";
import { useTwoShops } from "#tests/factories/two-shops.ts";

const scene = useTwoShops();

type Method = "get" | "post";
const requests = Object.entries(asked).flatMap(([file, route]) =>
  (["get", "post"] as Method[]).flatMap((method) => {
    const permission = route[method];
    return permission ? [{ file, route, method, permission }] : [];
  }),
);

function ask({ route, method }: (typeof requests)[number], cookie: string) {
  const path = route.at(scene.shop);
  return method === "get" ? scene.app.get(path, cookie) : scene.app.post(path, cookie, route.form?.(scene.shop) ?? {});
}

describe("every route", () => {
  test("with a loader or an action is in the table of who may, with both", async () => {
    const listed = await listRoutes();
    const known = new Set([...Object.keys(asked), ...ofNoShop]);
    for (const { file, module } of listed) {
      if (!module.loader && !module.action) continue;
      expect(known, `tests/factories/asked-routes.ts says nothing of ${file}`).toContain(file);
      const route = asked[file];
      if (!route) continue;
      expect({ file, loader: Boolean(route.get), action: Boolean(route.post) }).toEqual({
        file,
        loader: Boolean(module.loader),
        action: Boolean(module.action),
      });
    }
  });

  test("file with a loader or an action has an address in app/routes.ts", async () => {
    const listed = new Set((await listRoutes()).map(({ file }) => file));
    for (const file of await filesWithHandlers()) expect(listed, file).toContain(file);
  });

  test("of a shop stands below a layout that guards it", async () => {
    const open = await scene.app.get("/nowhere-at-all");
    expect(open.status).toBe(404);
    for (const request of requests) {
      const { status, location } = await ask(request, "");
      const isApi = request.file.startsWith("routes/api/");
      expect({ ...request, status, to: location?.slice(0, 12) ?? null }).toEqual({
        ...request,
        status: isApi ? 401 : 302,
        to: isApi ? null : "/sign-in?to=",
      });
    }
  });
});

describe.each(roles)("%s", (role) => {
  const allowed = requests.filter(({ permission }) => can(role, permission));
  const refused = requests.filter(({ permission }) => !can(role, permission));

  test.each(allowed)("may $method $file", async (request) => {
    const { status, body } = await ask(request, scene.cookies[role]);
    // The hold in the furnished shop is the maker's; that only owners change those of others is tested below.
    expect({ status, body: status < 400 ? "" : body }).toEqual({ status: expect.any(Number), body: "" });
    expect(request.method === "get" ? [200] : [200, 302]).toContain(status);
  });

  if (refused.length > 0)
    test.each(refused)("may not $method $file", async (request) => {
      const before = await scene.written();
      const { status } = await ask(request, scene.cookies[role]);
      expect(status).toBe(403);
      expect(await scene.written()).toBe(before);
    });
});

describe("money", () => {
  const seen = (body: string) => secretMoney.filter((minor) => body.replace(/[.,\s]/g, "").includes(String(minor)));
  const pages = requests.filter(({ method, permission }) => method === "get" && can("helper", permission));

  /** Names of values that look like money and hold a figure. */
  function moneyIn(value: unknown, path = ""): string[] {
    if (value === null || typeof value !== "object") return [];
    return Object.entries(value).flatMap(([name, inner]) => {
      const here = `${path}.${name}`;
      if (inner !== null && typeof inner === "object") return moneyIn(inner, here);
      return /cost|price|freight|minor|money/i.test(name) && /\d/.test(String(inner)) ? [here] : [];
    });
  }

  test.each(pages)("is nowhere in what a helper gets from $file", async (request) => {
    const { body, headers } = await ask(request, scene.cookies.helper);
    expect(seen(body)).toEqual([]);
    // A calculator works with figures that whoever asks has typed.
    if (request.file.startsWith("routes/calculators/")) return;
    const isData = /^(text\/plain|application\/json)/.test(headers.get("Content-Type") ?? "");
    expect(isData ? moneyIn(JSON.parse(body)) : []).toEqual([]);
  });

  test("is there for a maker: a board's, a project's, a delivery's", async () => {
    const { shop, cookies, app } = scene;
    const at = async (path: string) => seen((await app.get(path, cookies.maker)).body).length > 0;
    expect(await at(`/boards/${shop.boardId}`)).toBe(true);
    expect(await at(`/deliveries/${shop.talliedId}`)).toBe(true);
    expect(await at("/files/deliveries.csv")).toBe(true);
    const { body } = await app.get(`/projects/${shop.projectId}`, cookies.maker);
    expect(JSON.parse(body).loaderData["routes/projects/project.tsx"].costMinor).toBeGreaterThan(0);
  });
});

describe("a hold of somebody else's", () => {
  test.each(["extend", "let go"])("%s: owners may, other makers and helpers may not", async (intent) => {
    const { shop, cookies, app, db } = scene;
    const path = `/holds/${shop.holdId}`;
    await db()("holds").where({ id: shop.holdId }).update({ placed_by: shop.colleagueId });
    expect((await app.post(path, cookies.maker, { intent })).status).toBe(403);
    expect((await app.post(path, cookies.helper, { intent })).status).toBe(403);
    expect((await app.post(path, cookies.owner, { intent })).status).toBe(302);
  });
});

describe("a page of somebody else's", () => {
  const writes = requests.filter(({ method }) => method === "post");

  // The framework looks at pages, our own guard at JSON. A browser always says where a write comes from.
  test.each(writes)("cannot write to $file with our people's cookie", async ({ file, route }) => {
    const before = await scene.written();
    const sent = route.form?.(scene.shop) ?? {};
    const origins = file.startsWith("routes/api/")
      ? ["https://evil.example", "null", "", null]
      : ["https://evil.example"];
    for (const origin of origins) {
      const { status } = await scene.app.post(route.at(scene.shop), scene.cookies.owner, sent, origin);
      expect(status).toBeGreaterThanOrEqual(400);
      expect(status).toBeLessThan(500);
    }
    expect(await scene.written()).toBe(before);
  });
});

describe("somebody who was removed from the shop", () => {
  test("is out at the next request", async () => {
    const { shop, cookies, app, db } = scene;
    await db()("memberships").where({ person_id: shop.people.maker.personId }).delete();
    expect(await app.get(`/boards/${shop.boardId}`, cookies.maker)).toMatchObject({ status: 302, location: "/shops" });
    expect(await app.get("/api/boards?q=WO", cookies.maker)).toMatchObject({ status: 403 });
    expect(await app.get(`/files/photos/${shop.photoId}/small`, cookies.maker)).toMatchObject({ status: 302 });
  });

  test("or made a helper, is one at the next request", async () => {
    const { shop, cookies, app, db } = scene;
    await db()("memberships").where({ person_id: shop.people.maker.personId }).update({ role: "helper" });
    expect((await app.get("/deliveries", cookies.maker)).status).toBe(403);
    const { body } = await app.get(`/boards/${shop.boardId}`, cookies.maker);
    expect(JSON.parse(body).loaderData["routes/boards/board.tsx"].board.costMinor).toBeNull();
  });
});
