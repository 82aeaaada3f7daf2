import type { RouteConfigEntry } from "@react-router/dev/routes";
import type { Knex } from "knex";
import { pino } from "pino";
import { createRequestHandler, type RouterContextProvider, type ServerBuild } from "react-router";
import routes from "#app/routes.ts";
import {
  dbContext,
  logContext,
  mailerContext,
  plannerContext,
  ringReaderContext,
  storageContext,
} from "#app/server/context.server.ts";
import { findVisitor } from "#app/server/visit.server.ts";
import type { Letter } from "#app/services/mail.server.ts";
import type { Planner } from "#app/services/planner.server.ts";
import type { RingReader } from "#app/services/ring-reader.server.ts";
import type { Storage } from "#app/services/storage.server.ts";

/** What a route file exports. */
type RouteModule = Record<"loader" | "action" | "default" | "middleware", unknown>;

const modules = import.meta.glob<RouteModule>(["/app/routes/**/*.{ts,tsx}", "!**/*.{test,fixture}.ts"]);

export interface ListedRoute {
  /** Such as "routes/boards/board.tsx". */
  file: string;
  /** Such as "/boards/:boardId". */
  path: string;
  module: RouteModule;
}

/** Every route of app/routes.ts with its file and its address. */
export async function listRoutes(): Promise<ListedRoute[]> {
  const found: ListedRoute[] = [];
  const walk = async (entries: RouteConfigEntry[], above: string) => {
    for (const { file, path, children } of entries) {
      const address = path ? `${above}/${path}` : above;
      found.push({ file, path: address || "/", module: await load(file) });
      await walk(children ?? [], address);
    }
  };
  await walk(routes, "");
  return found;
}

async function load(file: string): Promise<RouteModule> {
  const module = modules[`/app/${file}`];
  if (!module) throw new Error(`there is no ${file}`);
  return module();
}

/** The files under app/routes that export a loader or an action, named in app/routes.ts or not. */
export async function filesWithHandlers(): Promise<string[]> {
  const all = await Promise.all(
    Object.entries(modules).map(async ([file, module]) => ({ file, module: await module() })),
  );
  return all
    .filter(({ module }) => module.loader || module.action)
    .map(({ file }) => file.slice("/app/".length))
    .sort();
}

export interface Answer {
  status: number;
  location: string | null;
  headers: Headers;
  /** What the page would be drawn from, by route; or the body of a file or of JSON. */
  body: string;
}

export interface ShopApp {
  get(path: string, cookie?: string): Promise<Answer>;
  /** Posts a form, or JSON, as a page of ours would. */
  post(
    path: string,
    cookie: string,
    sent: Record<string, string> | { json: unknown },
    /** The page it comes from, as a browser says; null when nothing says so. */
    origin?: string | null,
  ): Promise<Answer>;
}

const base = "http://rack.example";

/** A reader that sees nothing on any photo. */
const blindReader: RingReader = {
  ask: async () => ({ ok: false, message: "Nothing was seen.", corners: null }),
  close: async () => {},
};

/** A planner that plans nothing. */
const idlePlanner: Planner = {
  ask: async () => ({ ok: false, error: "Nothing was planned." }),
  close: async () => {},
};

/**
 * The app itself, every route with the real routing, sessions and guards, and the framework's own server; only that a page answers with what it would be
 * drawn from, as JSON. So nothing is built or drawn.
 *
 * @param outside the database of the moment, and where files are kept.
 */
export async function shopApp(outside: { db: () => Knex; storage: Storage }): Promise<ShopApp> {
  const letters: Letter[] = [];
  const log = pino({ level: "silent" });
  const setOutside = ({ context }: { context: RouterContextProvider }) => {
    context.set(dbContext, outside.db());
    context.set(storageContext, outside.storage);
    context.set(logContext, log);
    context.set(ringReaderContext, blindReader);
    context.set(plannerContext, idlePlanner);
    context.set(mailerContext, { send: async (letter) => void letters.push(letter), close: () => {} });
  };
  let broken: unknown = null;
  const handle = createRequestHandler(
    {
      routes: await manifest([setOutside, findVisitor]),
      entry: {
        module: {
          default: (_request: Request, status: number, headers: Headers, { staticHandlerContext }: Drawn) =>
            new Response(plainJson(staticHandlerContext), { status, headers }),
          handleError: (error: unknown) => {
            broken = error;
          },
        },
      },
      assets: { entry: { imports: [], module: "" }, routes: {}, url: "", version: "" },
      basename: "/",
      publicPath: "/",
      assetsBuildDirectory: "",
      future: { v8_middleware: true, v8_passThroughRequests: true, v8_trailingSlashAwareDataRequests: true },
      ssr: true,
      isSpaMode: false,
      prerender: [],
      routeDiscovery: { mode: "initial" },
    } as unknown as ServerBuild,
    "test",
  );

  async function ask(request: Request): Promise<Answer> {
    broken = null;
    const response = await handle(request);
    // What the framework hides from people as a 500 is a bug, and the test wants to see it.
    if (broken instanceof Error && response.status >= 500) throw broken;
    const { status, headers } = response;
    return { status, headers, location: headers.get("Location"), body: await response.text() };
  }

  return {
    get: (path, cookie = "") => ask(new Request(base + path, { headers: { Cookie: cookie } })),
    post(path, cookie, sent, origin = base) {
      const headers = new Headers({ Cookie: cookie, Host: "rack.example" });
      if (origin !== null) headers.set("Origin", origin);
      const isJson = "json" in sent;
      if (isJson) headers.set("Content-Type", "application/json");
      const body = isJson ? JSON.stringify(sent.json) : new URLSearchParams(sent as Record<string, string>);
      return ask(new Request(base + path, { method: "POST", headers, body }));
    },
  };
}

interface Drawn {
  staticHandlerContext: { loaderData: unknown; actionData: unknown; errors: unknown };
}

function plainJson({ loaderData, actionData, errors }: Drawn["staticHandlerContext"]): string {
  return JSON.stringify({ loaderData, actionData, errors }, (_, value) =>
    typeof value === "bigint" ? String(value) : value instanceof Map ? [...value] : value,
  );
}

async function manifest(middleware: unknown[]): Promise<Record<string, unknown>> {
  const root = { id: "root", path: "", module: { default: () => null, middleware } };
  const found: Record<string, unknown> = { root };
  const add = async (entries: RouteConfigEntry[], parentId: string) => {
    for (const { file, path, index, children } of entries) {
      found[file] = { id: file, parentId, path, index, module: await load(file) };
      await add(children ?? [], file);
    }
  };
  await add(routes, "root");
  return found;
}
