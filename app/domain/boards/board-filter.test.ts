import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { boardStates } from "./board.ts";
import { readBoardFilter } from "./board-filter.ts";

const read = (query: string | Record<string, string>) => readBoardFilter(new URLSearchParams(query), "in");
const unfiltered = read("");

test("an empty address asks for the racked boards, newest first", () => {
  expect(unfiltered).toMatchObject({ q: "", state: "racked", sort: "newest", page: 1, minLengthMm: null });
});

describe("a value that makes sense is taken", () => {
  test.each<[Record<string, string>, object]>([
    [{ q: "  live edge " }, { q: "live edge" }],
    [{ species: "white-oak" }, { species: "white-oak" }],
    [{ quarters: "8" }, { quarters: 8 }],
    [{ length: "7' 2\"" }, { length: "7' 2\"", minLengthMm: 2184.4 }],
    [{ width: "8 1/4" }, { width: "8 1/4", minWidthMm: 209.55 }],
    [{ rings: "rift" }, { rings: "rift" }],
    [{ rings: "unread" }, { rings: "unread" }],
    ...[...boardStates, "any"].map((state): [Record<string, string>, object] => [{ state }, { state }]),
    [{ moisture: "8.5" }, { moisture: 8.5 }],
    [{ moisture: "0" }, { moisture: 0 }],
    [{ figure: "bird's eye" }, { figure: "bird's eye" }],
    [{ free: "yes" }, { free: "yes" }],
    ...["newest", "tag", "length", "width", "moisture", "angle"].map((sort): [Record<string, string>, object] => [
      { sort },
      { sort },
    ]),
    [{ page: "3" }, { page: 3 }],
  ])("%o", (given, taken) => {
    expect(read(given)).toEqual({ ...unfiltered, ...taken });
  });
});

describe("a value that makes none is as if it were not there", () => {
  test.each<Record<string, string>>([
    { q: "x".repeat(10_000) },
    { species: "s".repeat(61) },
    { quarters: "0" },
    { quarters: "-4" },
    { quarters: "8/4" },
    { quarters: "1e99" },
    { quarters: "4.5" },
    { length: "x".repeat(21) },
    { rings: "curly" },
    { state: "burnt" },
    { state: "RACKED" },
    { arm: "a".repeat(14) },
    { arm: "☃" },
    { project: "é".repeat(13) },
    { delivery: "0123456789ab" },
    { project: "p".repeat(5000) },
    { delivery: "d".repeat(14) },
    { moisture: "wet" },
    { moisture: "-1" },
    { moisture: "Infinity" },
    { moisture: "NaN" },
    { free: "no" },
    { sort: "cost" },
    { sort: "__proto__" },
    { page: "0" },
    { page: "-1" },
    { page: "1.5" },
    { page: "last" },
    { page: "99999999999999999999" },
    { page: "" },
    { __proto__x: "1", constructor: "1", toString: "1" },
  ])("%o", (given) => {
    expect(read(given)).toEqual(unfiltered);
  });

  test("a length that cannot be read stays in its box and filters nothing", () => {
    expect(read({ length: "long" })).toEqual({ ...unfiltered, length: "long" });
    expect(read({ width: "-3" })).toEqual({ ...unfiltered, width: "-3" });
  });

  test("__proto__ in the address is nothing special", () => {
    const filter = read("__proto__=x&__proto__[state]=any&constructor.prototype.state=any");
    expect(filter).toEqual(unfiltered);
    expect(Object.getPrototypeOf(filter)).toBe(Object.prototype);
  });
});

test("given twice, the last counts", () => {
  expect(read("state=used&state=lost").state).toBe("lost");
  expect(read("state=used&state=nonsense").state).toBe("racked");
});

test("whatever stands in the address is read", () => {
  const keys = fc.constantFrom(...Object.keys(unfiltered), "__proto__", "free", "quarters", "moisture", "rings");
  const values = fc.oneof(
    fc.string({ unit: "binary" }),
    fc.string(),
    fc.double().map(String),
    fc.constantFrom("\0", "\ud800", "%", "null", "undefined", "[]", "{}", "🪵", "' OR 1=1 --"),
  );
  fc.assert(
    fc.property(fc.array(fc.tuple(keys, values), { maxLength: 20 }), fc.constantFrom("in", "mm"), (pairs, unit) => {
      const filter = readBoardFilter(new URLSearchParams(pairs), unit as "in" | "mm");
      expect(Number.isInteger(filter.page) && filter.page >= 1).toBe(true);
      for (const mm of [filter.minLengthMm, filter.minWidthMm])
        expect(mm === null || (Number.isFinite(mm) && mm >= 0)).toBe(true);
      expect(filter.q.length).toBeLessThanOrEqual(80);
      expect([...boardStates, "any"]).toContain(filter.state);
    }),
  );
});
