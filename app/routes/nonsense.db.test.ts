import { describe, expect, test } from "vitest";
import { asked } from "#tests/factories/asked-routes.ts";
import { useTwoShops } from "#tests/factories/two-shops.ts";

const scene = useTwoShops();

const posts = Object.entries(asked)
  .filter(([, route]) => route.post)
  .map(([file, route]) => ({ file, route }));

/** What no page of ours sends: nothing, too much, other numbers, other writing, what a database or a program might take for something else. */
const odd = ["", "☃", "-1", "1e309", "NaN", "\0", "x".repeat(5000), "9".repeat(40), "__proto__", "{}", "[]", "null"];

/** Those of them that are tried on each field alone. */
const oddest = ["", "☃", "-1", "1e309", "9".repeat(40), "[]"];

/** Nonsense is answered in words, never by an error. The test app throws whatever would have been an error page. */
function expectAnswered(status: number, what: unknown): void {
  expect({ what, isAnswered: status < 500 }).toEqual({ what, isAnswered: true });
}

describe("nonsense in a form", () => {
  test.each(posts)("for $file", async ({ route }) => {
    const { app, cookies, shop } = scene;
    const path = route.at(shop);
    const sent = route.form?.(shop) ?? {};
    if ("json" in sent) {
      const body = sent.json as Record<string, unknown>;
      const values = [...odd, null, 1e308, -1, 0.5, [], {}, [[]], [null], { length: 3 }];
      for (const json of [null, "text", 7, [], {}, ...values])
        expectAnswered((await app.post(path, cookies.owner, { json })).status, json);
      for (const name of Object.keys(body))
        for (const value of values)
          expectAnswered((await app.post(path, cookies.owner, { json: { ...body, [name]: value } })).status, [
            name,
            value,
          ]);
      return;
    }
    expectAnswered((await app.post(path, cookies.owner, {})).status, "an empty form");
    for (const value of odd) {
      const all = Object.fromEntries(Object.keys(sent).map((name) => [name, value]));
      expectAnswered((await app.post(path, cookies.owner, all)).status, ["everything", value]);
    }
    for (const value of oddest)
      for (const name of Object.keys(sent))
        expectAnswered((await app.post(path, cookies.owner, { ...sent, [name]: value })).status, [name, value]);
  });
});

describe("nonsense in an address", () => {
  const gets = Object.entries(asked)
    .filter(([, route]) => route.get)
    .map(([file, route]) => ({ file, route }));

  /** Every word that any page reads from its address. */
  const words =
    "q species quarters length width rings state arm moisture figure project delivery free sort page supplier tally board sheet skip to".split(
      " ",
    );

  test.each(gets)("for $file", async ({ route }) => {
    const { app, cookies, shop } = scene;
    const [path, query = ""] = route.at(shop).split("?");
    for (const value of odd) {
      const params = new URLSearchParams(query);
      for (const word of words) params.set(word, value);
      expectAnswered((await app.get(`${path}?${params}`, cookies.owner)).status, value);
    }
  });
});
