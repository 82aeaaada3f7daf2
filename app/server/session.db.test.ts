import { RouterContextProvider } from "react-router";
import { afterEach, describe, expect, test, vi } from "vitest";
import { endSessionOf, sessionsOf } from "#app/domain/people/sessions.sql.server.ts";
import { aPerson, aShop } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { dbContext, visitContext } from "./context.server.ts";
import { endSession, keepSession, readSession, readVisit, setsSession, startSession } from "./session.server.ts";
import { findVisitor } from "./visit.server.ts";

const began = new Date("2027-03-01T09:00:00Z");
const minute = 60_000;
const day = 86_400_000;
const after = (ms: number) => new Date(began.getTime() + ms);

/** What a browser sends back of a Set-Cookie header. */
const asked = (line: string) =>
  new Request("http://rack.example/rack", { headers: { Cookie: line.split(";")[0] ?? "" } });
const stranger = () => new Request("http://rack.example/sign-in", { headers: { "User-Agent": "A phone" } });

/** The module as it runs under other settings. */
async function under(settings: Record<string, string>): Promise<typeof import("./session.server.ts")> {
  for (const [name, value] of Object.entries(settings)) vi.stubEnv(name, value);
  vi.resetModules();
  return import("./session.server.ts");
}

afterEach(() => {
  vi.unstubAllEnvs();
  vi.resetModules();
});

describe("a session", () => {
  const db = useTestDb();

  async function signedIn() {
    const person = await aPerson(db());
    const shopId = await aShop(db());
    return { person, shopId, line: await startSession(db(), stranger(), { personId: person.id, shopId }, began) };
  }
  const row = () => db()("sessions").first("last_seen_at", "expires_at", "secret_hash", "user_agent");

  test("is known by a cookie that scripts cannot read and other sites cannot send along", async () => {
    const { line, person, shopId } = await signedIn();
    expect(line).toMatch(/; HttpOnly/);
    expect(line).toMatch(/; SameSite=Lax/);
    expect(line).toMatch(/; Path=\//);
    expect(line).not.toMatch(/Secure/);
    expect(await readVisit(db(), asked(line), began)).toMatchObject({ personId: person.id, shopId });
    expect(await row()).toMatchObject({ user_agent: "A phone", secret_hash: expect.stringMatching(/^[0-9a-f]{64}$/) });
  });

  test("has a Secure cookie as soon as the shop is reached by https", async () => {
    const person = await aPerson(db());
    const { startSession: start } = await under({ PUBLIC_URL: "https://rack.example" });
    expect(await start(db(), stranger(), { personId: person.id, shopId: null }, began)).toMatch(/; Secure/);
  });

  test("is nobody's when the cookie is edited, unsigned or somebody's guess", async () => {
    const { line } = await signedIn();
    const [value = ""] = line.split(";");
    for (const forged of [
      `${value}x`,
      // The first letter of the signature.
      value.replace(/\.(.)/, (_, letter) => (letter === "A" ? ".B" : ".A")),
      `session=${(value.split("=")[1] ?? "").split(".")[0]}`,
      `session=${Buffer.from('"a guess"').toString("base64")}`,
      "session=",
    ])
      expect(await readVisit(db(), asked(forged), began), forged).toBeNull();
  });

  test("outlives a change of secrets: the old one is believed, the new one signs", async () => {
    const { line, person } = await signedIn();
    const old = "a secret that is only for tests and is long enough";
    const fresh = "another secret of thirty-two characters or more";
    const both = await under({ SESSION_SECRETS: `${fresh},${old}` });
    const visit = await both.readVisit(db(), asked(line), began);
    expect(visit).toMatchObject({ personId: person.id });
    if (!visit) throw new Error("nobody");
    const resigned = (await both.keepSession(db(), asked(line), visit, after(day * 2))) ?? "";
    const later = await under({ SESSION_SECRETS: fresh });
    expect(await later.readVisit(db(), asked(line), began)).toBeNull();
    expect(await later.readVisit(db(), asked(resigned), after(day * 2))).toMatchObject({ personId: person.id });
  });

  test("notes when it was last used, every five minutes at most", async () => {
    const { line } = await signedIn();
    await readSession(db(), asked(line), after(4 * minute));
    expect((await row())?.last_seen_at).toEqual(began);
    await readSession(db(), asked(line), after(6 * minute));
    expect((await row())?.last_seen_at).toEqual(after(6 * minute));
  });

  test("ends sixty days after its last use, not after its first", async () => {
    const { line } = await signedIn();
    expect(await readVisit(db(), asked(line), after(59 * day))).not.toBeNull();
    expect(await readVisit(db(), asked(line), after(61 * day))).toBeNull();
    const found = await readSession(db(), asked(line), after(59 * day));
    expect(found?.dueToExtend).toBe(true);
    if (!found) throw new Error("no session");
    const kept = await keepSession(db(), asked(line), found.visit, after(59 * day));
    expect(kept).toMatch(/; Max-Age=5184000/);
    expect(await readVisit(db(), asked(kept ?? ""), after(100 * day))).not.toBeNull();
  });

  test("that is over is swept out when somebody else signs in", async () => {
    await signedIn();
    const other = await aPerson(db());
    await startSession(db(), stranger(), { personId: other.id, shopId: null }, after(61 * day));
    expect(await db()("sessions").pluck("person_id")).toEqual([other.id]);
  });

  test("ended by its person from another device is over there at once", async () => {
    const { line, person } = await signedIn();
    const phone = await startSession(db(), stranger(), { personId: person.id, shopId: null }, after(minute));
    const [newest, oldest] = await sessionsOf(db(), person.id, after(minute));
    expect(await endSessionOf(db(), person.id, oldest?.id ?? "")).toBe(true);
    expect(await readVisit(db(), asked(line), after(minute))).toBeNull();
    expect(await readVisit(db(), asked(phone), after(minute))).toMatchObject({ sessionId: newest?.id });
  });
});

describe("the middleware that finds a visitor", () => {
  const db = useTestDb();

  /** One request through it, answered as the route would. */
  async function pass(request: Request, answer: () => Response | Promise<Response> = () => new Response("a page")) {
    const context = new RouterContextProvider();
    context.set(dbContext, db());
    const next = async () => answer();
    const args = { request, context, params: {}, url: new URL(request.url), pattern: "" };
    const response = (await findVisitor(args as never, next)) as Response;
    return { visit: context.get(visitContext), line: response.headers.get("Set-Cookie") };
  }
  const begin = async (ageMs: number) => {
    const person = await aPerson(db());
    return startSession(db(), stranger(), { personId: person.id, shopId: null }, new Date(Date.now() - ageMs));
  };

  test("lets a stranger pass as nobody, with whatever cookie", async () => {
    expect(await pass(stranger())).toEqual({ visit: null, line: null });
    expect(await pass(asked("session=rubbish"))).toEqual({ visit: null, line: null });
  });

  test("sets no cookie for a session of today, and sets it anew for an older one", async () => {
    const today = await begin(minute);
    expect(await pass(asked(today))).toMatchObject({ visit: expect.any(Object), line: null });
    const older = await begin(3 * day);
    const { line } = await pass(asked(older));
    expect(line?.split(";")[0]).toBe(older.split(";")[0]);
    expect((await pass(asked(older))).line).toBeNull();
  });

  test("leaves files and signing out alone", async () => {
    const older = await begin(3 * day);
    const file = () => new Response("a photo", { headers: { "Cache-Control": "private, immutable" } });
    expect((await pass(asked(older), file)).line).toBeNull();
    const signOut = async () =>
      new Response(null, { status: 302, headers: { "Set-Cookie": await endSession(db(), asked(older)) } });
    const { line } = await pass(asked(older), signOut);
    expect(line).toMatch(/^session=; Max-Age=0/);
  });

  test("tells a session's cookie from others", () => {
    expect(setsSession(new Headers({ "Set-Cookie": "session=x; Path=/" }))).toBe(true);
    expect(setsSession(new Headers({ "Set-Cookie": "theme=dark; Path=/" }))).toBe(false);
  });
});
