import { describe, expect, test } from "vitest";
import { boardPathOf } from "./board-path.ts";

describe("boardPathOf", () => {
  test("a tag's address opens its board, wherever the shop was reached when it was printed", () => {
    expect(boardPathOf("https://rack.example/boards/1w9qxzk90p3k2")).toBe("/boards/1w9qxzk90p3k2");
    expect(boardPathOf("http://192.168.1.20:4310/boards/1w9qxzk90p3k2?x=1#y")).toBe("/boards/1w9qxzk90p3k2");
  });

  test.each([
    "",
    "WO-0142",
    "https://elsewhere.example/",
    "https://rack.example/boards/short",
    "javascript:/boards/1w9qxzk90p3k2x",
    "https://rack.example/boards/1w9qxzk90p3k2/delete",
  ])("%s is no tag of ours", (text) => {
    expect(boardPathOf(text)).toBeNull();
  });
});
