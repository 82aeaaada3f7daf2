import { describe, expect, test } from "vitest";
import { dayField } from "./day-field.ts";

describe("dayField", () => {
  test.each(["2027-02-28", "2028-02-29", "1999-12-31"])("%s is a day", (day) => {
    expect(dayField("When?").parse(day)).toBe(day);
  });

  test.each([
    "2027-02-31",
    "2027-02-29",
    "2027-13-01",
    "2027-00-10",
    "27-01-01",
    "1.2.2027",
    "tomorrow",
    "",
    "0000-01-01",
  ])("%s is none", (day) => {
    expect(dayField("When?").safeParse(day).success).toBe(false);
  });

  test("nothing at all is asked for in the form's own words", () => {
    expect(dayField("When did it come?").safeParse(undefined).error?.issues[0]?.message).toBe("When did it come?");
  });
});
