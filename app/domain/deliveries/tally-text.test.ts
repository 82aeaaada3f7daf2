import { describe, expect, it } from "vitest";
import { printTallyText, readTallyText } from "./tally-text.ts";

const carried = { quarters: "4", species: "white-oak" };
const rows = (text: string) => readTallyText(text, carried).map(({ row }) => row);

describe("a tally written as lines", () => {
  it("is a row a line, quarters and species holding until others are given", () => {
    expect(rows(`8 1/4 x 10'6"\n3 @ 8 x 10', 5/4\n\n7 x 9', Black walnut\n6 x 8'`)).toEqual([
      { count: "", width: "8 1/4", length: `10'6"`, quarters: "4", species: "white-oak" },
      { count: "3", width: "8", length: "10'", quarters: "5", species: "white-oak" },
      { count: "", width: "7", length: "9'", quarters: "5", species: "black-walnut" },
      { count: "", width: "6", length: "8'", quarters: "5", species: "black-walnut" },
    ]);
  });

  it("counts empty lines where it says which line", () => {
    expect(readTallyText("8 x 10\r\n\r\n7 x 9", carried).map(({ lineNumber }) => lineNumber)).toEqual([1, 3]);
  });

  it("knows a species by each of its names, even with a comma in it", () => {
    expect(rows("8 x 10', Oak, white")[0]?.species).toBe("white-oak");
    expect(rows("8 x 10', WHITE OAK")[0]?.species).toBe("white-oak");
    expect(rows("8 x 10', wallnut")[0]?.species).toBe("wallnut");
  });

  it("keeps a comma that is a decimal point", () => {
    expect(rows("8,25 x 10")[0]).toMatchObject({ width: "8,25", length: "10" });
  });

  it("takes quarters written first, and a count written last", () => {
    expect(rows("5/4 x 8 x 10'")[0]).toMatchObject({ quarters: "5", width: "8", length: "10'" });
    expect(rows("8 x 10', 3 pcs")[0]).toMatchObject({ count: "3", width: "8" });
  });

  it("reads cells of a sheet", () => {
    expect(rows("8\t10'")[0]).toMatchObject({ count: "", width: "8", length: "10'" });
    expect(rows("3\t8\t10'\t5/4\tcherry")[0]).toMatchObject({ count: "3", width: "8", length: "10'", quarters: "5" });
    expect(rows("8\t10'\t5/4")[0]).toMatchObject({ count: "", width: "8", quarters: "5" });
    expect(rows("8 x 10'\t5/4")[0]).toMatchObject({ width: "8", length: "10'", quarters: "5" });
  });

  it("keeps what it cannot read, for the message to stand beside", () => {
    expect(rows("hello")[0]).toMatchObject({ width: "hello", length: "" });
  });

  it("reads back what it prints", () => {
    const some = rows(`8 1/4 x 10'6"\n3 @ 8 x 10', 5/4\n7 x 9', Black walnut\n6`);
    expect(readTallyText(printTallyText(some, carried), carried).map(({ row }) => row)).toEqual(some);
  });
});
