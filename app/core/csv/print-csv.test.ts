import fc from "fast-check";
import Papa from "papaparse";
import { describe, expect, test } from "vitest";
import { csvLine } from "./print-csv.ts";

describe("csvLine", () => {
  test("quotes commas, quotes and line ends as RFC 4180 says", () => {
    expect(csvLine(["a,b", 'say "rift"', "two\nlines", 8.25, null])).toBe(
      '"a,b","say ""rift""","two\nlines",8.25,\r\n',
    );
  });

  test("a note that looks like a formula stays a note", () => {
    expect(csvLine(["=HYPERLINK(1)", "-5 degrees", "+1", "@now"])).toBe("'=HYPERLINK(1),'-5 degrees,'+1,'@now\r\n");
  });

  test("a general CSV reader reads back what was written", () => {
    const text = fc.string().filter((value) => !/^[=+\-@\t\r]/.test(value));
    fc.assert(
      fc.property(fc.array(text, { minLength: 2, maxLength: 6 }), (values) => {
        const { data } = Papa.parse<string[]>(csvLine(values).slice(0, -2), { newline: "\r\n", delimiter: "," });
        expect(data[0]).toEqual(values);
      }),
    );
  });
});
