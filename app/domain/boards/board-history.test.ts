import { expect, test } from "vitest";
import { type EventDetail, eventWords } from "./board-history.ts";

/** Details as they are written to a board's history, and the line its page shows. */
test.each<[EventDetail, string]>([
  [
    { project: "Chapel stools", "from (mm)": 0, "to (mm)": 1524, until: "2026-12-15", note: "back rails" },
    "Chapel stools, from 0 in, to 60 in, until 15 Dec 2026, “back rails”",
  ],
  [{ project: "Chapel stools", until: ["2026-12-15", "2026-12-29"] }, "Chapel stools, until 15 Dec 2026 → 29 Dec 2026"],
  [
    { end: "near", how: "strokes", "from (degrees)": 31, "to (degrees)": 52 },
    "near end, marked on a photo, from 31°, to 52°",
  ],
  [{ kind: "near end" }, "near end"],
  [{ "moisture (%)": 9.5, place: null }, "moisture 9.5 %"],
  [{ kind: "knot", "at (mm)": 508 }, "knot, at 20 in"],
  [{ "length (mm)": [3048, 3022.6] }, "length 120 in → 119 in"],
  [{ place: [null, "Bay A, arm 4"] }, "place none → Bay A, arm 4"],
  [{ note: "" }, ""],
])("%j", (detail, words) => {
  expect(eventWords(detail, "in")).toBe(words);
});
