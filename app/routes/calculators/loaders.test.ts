import fc from "fast-check";
import { RouterContextProvider } from "react-router";
import { describe, expect, test } from "vitest";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { aShopLike } from "#app/domain/calculators/shop.fixture.ts";
import { atWorkContext } from "#app/server/context.server.ts";
import { loader as air } from "./air.tsx";
import { loader as claim } from "./claim.tsx";
import { loader as glueUp } from "./glue-up.tsx";
import { loader as grade } from "./grade.tsx";
import { loader as leg } from "./leg.tsx";
import { loader as measure } from "./measure.tsx";
import { loader as meter } from "./meter.tsx";
import { loader as milling } from "./milling.tsx";
import { loader as movement } from "./movement.tsx";
import { loader as ready } from "./ready.tsx";
import { loader as rings } from "./rings.tsx";
import { loader as weight } from "./weight.tsx";

interface Loaded {
  values: Record<string, string>;
  errors: Record<string, string[]>;
  answer: unknown;
  refused: string | null;
}

const loaders = { air, claim, "glue-up": glueUp, grade, leg, measure, meter, milling, movement, ready, rings, weight };

function load(loader: unknown, units: "in" | "mm", given: Record<string, string> = {}): Loaded {
  const context = new RouterContextProvider();
  context.set(atWorkContext, {
    actor: { personId: "p", personName: "Ada", shopId: "shop", role: "helper" },
    shop: aShopLike({ units }),
  });
  const url = new URL(`http://shop.example/?${new URLSearchParams(given)}`);
  return (loader as (args: unknown) => Loaded)({ context, url, params: {}, request: new Request(url) });
}

test("every calculator in the list has its page", () => {
  const paths = Object.values(calculators).map(({ path }) => path.replace("/calculators/", ""));
  expect(paths.toSorted()).toEqual(Object.keys(loaders).toSorted());
});

const names = Object.keys(loaders) as (keyof typeof loaders)[];

describe.each(names)("the loader of /calculators/%s", (name) => {
  test.each(["in", "mm"] as const)("answers bare in a shop of %s, for a helper too", (units) => {
    const { answer, errors, refused } = load(loaders[name], units);
    expect({ errors, refused }).toEqual({ errors: {}, refused: null });
    expect(answer).not.toBeNull();
  });

  test("whatever the address says it answers, refuses beside a box or gives a reason: it never fails", () => {
    const { values } = load(loaders[name], "in");
    const typed = fc.oneof(
      fc.constantFrom("", "-1", "0", "1e308", "NaN", "8 1/0", "100000", "0.0001", "45", "1/2", "300", "pin", "angle"),
      fc.string({ maxLength: 12 }),
    );
    const address = fc.record(Object.fromEntries(Object.keys(values).map((box) => [box, typed])), { requiredKeys: [] });
    fc.assert(
      fc.property(address, fc.constantFrom("in" as const, "mm" as const), (given, units) => {
        const { answer, errors, refused } = load(loaders[name], units, given as Record<string, string>);
        const said = Object.values(errors).flat();
        expect(answer !== null || said.length > 0 || Boolean(refused)).toBe(true);
        expect([...said, refused ?? ""].join(" ")).not.toMatch(/undefined|NaN to|\[object|Invalid (input|option)/);
      }),
      { numRuns: 60 },
    );
  });
});
