import type { Knex } from "knex";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { mailerContext } from "#app/server/context.server.ts";
import { readVisit } from "#app/server/session.server.ts";
import { strangerContext } from "#tests/factories/at-work.ts";
import { aPerson } from "#tests/factories/shop.ts";
import { type FreshDatabase, freshDatabase, useTestDb } from "#tests/setup/test-db.ts";
import { action as typeCode } from "./code.tsx";
import { loader as lookAtLink, action as openLink } from "./link.tsx";
import { action as askForCode } from "./sign-in.tsx";
import { action as signOut } from "./sign-out.ts";

const base = "http://rack.example";

/** A browser: keeps cookies, posts forms, as somebody at an address. */
function browser(db: Knex, address = "203.0.113.7") {
  const { context, letters } = strangerContext(db);
  const cookies = new Map<string, string>();
  function request(path: string, body?: Record<string, string>, said: Record<string, string> = {}): Request {
    const headers = {
      Host: "rack.example",
      ...said,
      Cookie: [...cookies].map(([name, value]) => `${name}=${value}`).join("; "),
      "X-Client-Address": address,
    };
    return new Request(base + path, body ? { method: "POST", body: new URLSearchParams(body), headers } : { headers });
  }
  function keep(answer: unknown) {
    if (!(answer instanceof Response)) return answer;
    for (const line of answer.headers.getSetCookie()) {
      const [pair = ""] = line.split(";");
      const at = pair.indexOf("=");
      cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
    return answer;
  }
  const run = async (handler: unknown, path: string, body?: Record<string, string>, said?: Record<string, string>) => {
    const made = request(path, body, said);
    const args = { request: made, context, params: {}, url: new URL(made.url), pattern: "" };
    try {
      return keep(await (handler as (args: unknown) => unknown)(args));
    } catch (thrown) {
      return keep(thrown);
    }
  };
  return {
    cookies,
    letters,
    breakMail: () =>
      context.set(mailerContext, { send: async () => Promise.reject(new Error("no mail server")), close: () => {} }),
    run,
    ask: (email: string, to = "/boards") => run(askForCode, "/sign-in", { email, to }),
    type: (code: string) => run(typeCode, "/sign-in/code", { code }),
    visit: () => readVisit(db, request("/rack"), new Date()),
    newestCode() {
      const code = /code is (\d{6})/.exec(letters.at(-1)?.text ?? "")?.[1];
      if (!code) throw new Error("no code was mailed");
      return code;
    },
    newestLink: () => new URL(/https?:\S+/.exec(letters.at(-1)?.text ?? "")?.[0] ?? base),
  };
}

const wrongCode = (right: string) => String((Number(right) + 1) % 1_000_000).padStart(6, "0");
const statusOf = (answer: unknown) =>
  answer instanceof Response ? answer.status : ((answer as { init?: { status?: number } }).init?.status ?? 200);

describe("signing in by a mailed code", () => {
  const db = useTestDb();

  test("the code that was mailed lets one in, to where one wanted to go", async () => {
    const ana = browser(db());
    expect(statusOf(await ana.ask("Ana@Shop.Example", "/boards/1w9qxzk90p3k2"))).toBe(302);
    const answer = (await ana.type(ana.newestCode())) as Response;
    expect(answer.headers.get("Location")).toBe("/boards/1w9qxzk90p3k2");
    expect(await ana.visit()).toMatchObject({ email: "ana@shop.example" });
  });

  test("a wrong code does not, and says nothing of why", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    expect(statusOf(await ana.type(wrongCode(ana.newestCode())))).toBe(400);
    expect(await ana.visit()).toBeNull();
  });

  test("twenty guesses are not had: after five even the right code is refused", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    const right = ana.newestCode();
    for (let i = 0; i < 20; i++)
      await ana.type(String(i).padStart(6, "0") === right ? "999999" : String(i).padStart(6, "0"));
    expect(statusOf(await ana.type(right))).toBe(400);
    expect(await ana.visit()).toBeNull();
  });

  test("a code works once: the same browser, cookies put back, is refused", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    const before = new Map(ana.cookies);
    const code = ana.newestCode();
    await ana.type(code);
    const again = browser(db());
    for (const [name, value] of before) again.cookies.set(name, value);
    expect(statusOf(await again.type(code))).toBe(400);
    expect(await again.visit()).toBeNull();
  });

  test("a code mailed to one address signs in nobody else, however the library's cookie is edited", async () => {
    const thief = browser(db());
    await aPerson(db(), { email: "owner@shop.example" });
    await thief.ask("thief@shop.example");
    const code = thief.newestCode();
    const [name = "_totp", value = ""] = [...thief.cookies].find(([key]) => key === "_totp") ?? [];
    expect(value).not.toBe("");
    thief.cookies.set(name, value.replace(/thief(%40|@)/g, "owner$1").replace(/thief/g, "owner"));
    expect(statusOf(await thief.type(code))).toBe(400);
    expect(await thief.visit()).toBeNull();
  });

  test("our own cookie is signed: edited, it is no cookie", async () => {
    const thief = browser(db());
    await thief.ask("thief@shop.example");
    const value = thief.cookies.get("sign-in") ?? "";
    const [payload = "", signature = ""] = decodeURIComponent(value).split(".");
    const edited = Buffer.from(Buffer.from(payload, "base64").toString().replaceAll("thief", "owner")).toString(
      "base64",
    );
    thief.cookies.set("sign-in", encodeURIComponent(`${edited}.${signature}`));
    expect(statusOf(await thief.type(thief.newestCode()))).toBe(400);
    expect(await thief.visit()).toBeNull();
  });

  test("the code of one's own letter with the challenge of another's is refused", async () => {
    const victim = browser(db());
    const thief = browser(db());
    await victim.ask("owner@shop.example");
    await thief.ask("thief@shop.example");
    const own = thief.newestCode();
    thief.cookies.set("sign-in", victim.cookies.get("sign-in") ?? "");
    expect(statusOf(await thief.type(own))).toBe(400);
    expect(await thief.visit()).toBeNull();
  });

  test("a hundred letters are not sent: five to one address, whoever asks", async () => {
    let letters = 0;
    for (let i = 0; i < 100; i++) {
      const someone = browser(db(), `198.51.100.${i}`);
      await someone.ask("ana@shop.example");
      letters += someone.letters.length;
    }
    expect(letters).toBe(5);
  });

  test("one place does not mail a list of addresses", async () => {
    const spammer = browser(db());
    for (let i = 0; i < 60; i++) await spammer.ask(`person${i}@shop.example`);
    expect(spammer.letters.length).toBe(30);
  });

  test("whether an address is known cannot be told from the answer", async () => {
    await aPerson(db(), { email: "known@shop.example" });
    const [known, unknown] = [browser(db()), browser(db())];
    const answers = [
      (await known.ask("known@shop.example")) as Response,
      (await unknown.ask("new@shop.example")) as Response,
    ];
    expect(new Set(answers.map((answer) => `${answer.status} ${answer.headers.get("Location")}`)).size).toBe(1);
    expect(known.letters.length).toBe(unknown.letters.length);
  });

  test("fifty codes a day are tried for one address, however many letters; its link works all the same", async () => {
    const statuses: number[] = [];
    let newest = browser(db());
    for (let letter = 0; letter < 11; letter++) {
      newest = browser(db(), `198.51.100.${letter}`);
      await db()("rate_limits").where("bucket", "like", "code to%").delete();
      await newest.ask("ana@shop.example");
      for (let i = 0; i < 5; i++) statuses.push(statusOf(await newest.type(wrongCode(newest.newestCode()))));
    }
    expect(statuses.filter((status) => status === 400)).toHaveLength(50);
    expect(statuses.slice(50)).toEqual([429, 429, 429, 429, 429]);
    expect(statusOf(await newest.type(newest.newestCode()))).toBe(429);
    const form = { t: newest.newestLink().searchParams.get("t") ?? "" };
    expect(statusOf(await newest.run(openLink, "/sign-in/link", form))).toBe(302);
  });

  test("sixty codes are tried from one place, however many addresses", async () => {
    const statuses: number[] = [];
    for (let person = 0; person < 13; person++) {
      const guesser = browser(db(), `2001:db8:1:2::${person}`);
      await guesser.ask(`person${person}@shop.example`);
      for (let i = 0; i < 5; i++) statuses.push(statusOf(await guesser.type(wrongCode(guesser.newestCode()))));
    }
    expect(statuses.filter((status) => status === 400)).toHaveLength(60);
    expect(statuses.slice(60)).toEqual([429, 429, 429, 429, 429]);
  });

  test("a place that asks for too many letters does not use up what an address may be sent", async () => {
    const spammer = browser(db());
    for (let i = 0; i < 30; i++) await spammer.ask(`person${i}@shop.example`);
    for (let i = 0; i < 10; i++) await spammer.ask("ana@shop.example");
    const ana = browser(db(), "198.51.100.9");
    await ana.ask("ana@shop.example");
    expect(ana.letters).toHaveLength(1);
  });

  test("where to go after is left out when it is too long to keep, instead of shutting anybody out", async () => {
    const ana = browser(db());
    expect(statusOf(await ana.ask("ana@shop.example", `/boards?q=${"x".repeat(2100)}`))).toBe(302);
    const answer = (await ana.type(ana.newestCode())) as Response;
    expect(answer.headers.get("Location")).toBe("/");
  });

  test.each([
    [undefined, 302],
    [base, 302],
    ["https://evil.example", 403],
    ["null", 403],
  ])("signing out from a page of %s is answered %s", async (origin, status) => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    await ana.type(ana.newestCode());
    const answer = await ana.run(signOut, "/sign-out", {}, origin ? { Origin: origin } : {});
    expect(statusOf(answer)).toBe(status);
    expect((await ana.visit()) === null).toBe(status === 302);
  });

  test("a letter that cannot be sent is said, and nobody waits for it", async () => {
    const ana = browser(db());
    ana.breakMail();
    expect(statusOf(await ana.ask("ana@shop.example"))).toBe(503);
  });

  test("after ten minutes a code is old", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    await db()("sign_in_challenges").update({ expires_at: new Date(Date.now() - 1000) });
    expect(statusOf(await ana.type(ana.newestCode()))).toBe(400);
  });

  test("a mail scanner that opens the link, many times, signs nobody in and uses nothing up", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    const link = ana.newestLink();
    const scanner = browser(db(), "192.0.2.1");
    for (let i = 0; i < 3; i++) await scanner.run(lookAtLink, link.pathname + link.search);
    expect(scanner.cookies.size).toBe(0);
    const phone = browser(db(), "192.0.2.2");
    const form = { t: link.searchParams.get("t") ?? "", to: link.searchParams.get("to") ?? "" };
    expect(statusOf(await phone.run(openLink, "/sign-in/link", form))).toBe(302);
    expect(await phone.visit()).toMatchObject({ email: "ana@shop.example" });
    const late = browser(db());
    expect(statusOf(await late.run(openLink, "/sign-in/link", form))).toBe(410);
    expect(statusOf(await ana.type(ana.newestCode()))).toBe(400);
  });

  test.each([
    "https://evil.example/",
    "//evil.example",
    "/\\evil.example",
    "/..//evil.example",
    "javascript:alert(1)",
    "",
    "boards",
  ])("signing in never leads to %s", async (to) => {
    const ana = browser(db());
    await ana.ask("ana@shop.example", to);
    const answer = (await ana.type(ana.newestCode())) as Response;
    expect(answer.headers.get("Location")).toBe("/");
  });

  test("a session is a new one at each sign-in: the secret known before is worth nothing", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    await ana.type(ana.newestCode());
    const first = ana.cookies.get("session") ?? "";
    await ana.ask("ana@shop.example");
    await ana.type(ana.newestCode());
    expect(ana.cookies.get("session")).not.toBe(first);
    const thief = browser(db());
    thief.cookies.set("session", first);
    expect(await thief.visit()).toBeNull();
  });

  test("the database keeps no code, link or session secret as it is", async () => {
    const ana = browser(db());
    await ana.ask("ana@shop.example");
    const [code, token] = [ana.newestCode(), ana.newestLink().searchParams.get("t") ?? ""];
    await ana.type(code);
    const rows = JSON.stringify([await db()("sign_in_challenges").select(), await db()("sessions").select()]);
    expect(rows).not.toContain(token);
    expect(rows).not.toContain(`"${code}"`);
    const [payload = ""] = decodeURIComponent(ana.cookies.get("session") ?? "").split(".");
    expect(rows).not.toContain(JSON.parse(Buffer.from(payload, "base64").toString()));
  });
});

describe("at the same moment", () => {
  let fresh: FreshDatabase;
  beforeAll(async () => {
    fresh = await freshDatabase();
  });
  afterAll(() => fresh.drop());

  test("a right code submitted twice at once opens one session", async () => {
    const ana = browser(fresh.db);
    await ana.ask("ana@shop.example");
    const code = ana.newestCode();
    const twins = Array.from({ length: 4 }, () => {
      const twin = browser(fresh.db);
      for (const [name, value] of ana.cookies) twin.cookies.set(name, value);
      return twin;
    });
    const statuses = await Promise.all(twins.map(async (twin) => statusOf(await twin.type(code))));
    expect(statuses.filter((status) => status === 302)).toHaveLength(1);
    expect(await fresh.db("sessions").count({ n: "*" }).first()).toMatchObject({ n: 1 });
  });

  test("fifty guesses at once count as five", async () => {
    const ana = browser(fresh.db);
    await ana.ask("ben@shop.example");
    const right = ana.newestCode();
    await Promise.all(
      Array.from({ length: 50 }, (_, i) =>
        ana.type(
          wrongCode(
            String(Number(right) + i)
              .slice(-6)
              .padStart(6, "0"),
          ),
        ),
      ),
    );
    const row = await fresh.db("sign_in_challenges").where({ email: "ben@shop.example" }).first("attempts");
    expect(row.attempts).toBe(5);
  });
});
