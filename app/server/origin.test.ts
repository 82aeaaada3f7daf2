import { describe, expect, test } from "vitest";
import { originOf } from "./origin.server.ts";

const from = (headers: Record<string, string>) =>
  originOf(
    new Request("http://10.0.0.5:4310/rack", { method: "POST", headers: { Host: "10.0.0.5:4310", ...headers } }),
  );

describe("originOf", () => {
  test.each([
    [{ Origin: "http://10.0.0.5:4310" }, "ours"],
    // Behind a proxy the host is another; people reach the shop at PUBLIC_URL.
    [{ Origin: "http://rack.example" }, "ours"],
    [{ Origin: "http://rack.example", "Sec-Fetch-Site": "same-origin" }, "ours"],
    [{}, "unsaid"],
    [{ "Sec-Fetch-Site": "none" }, "unsaid"],
    [{ Origin: "https://evil.example" }, "foreign"],
    [{ Origin: "https://rack.example" }, "foreign"],
    [{ Origin: "http://rack.example.evil.example" }, "foreign"],
    [{ Origin: "null" }, "foreign"],
    [{ Origin: "" }, "foreign"],
    [{ "Sec-Fetch-Site": "cross-site" }, "foreign"],
    [{ "Sec-Fetch-Site": "same-site" }, "foreign"],
    [{ Origin: "http://rack.example", "Sec-Fetch-Site": "cross-site" }, "foreign"],
  ] as [Record<string, string>, string][])("takes %o as %s", (headers, expected) => {
    expect(from(headers)).toBe(expected);
  });
});
