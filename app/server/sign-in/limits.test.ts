import { describe, expect, test } from "vitest";
import { placeOf } from "./limits.server.ts";

describe("placeOf", () => {
  test.each([
    ["203.0.113.7", "203.0.113.7"],
    ["unknown", "unknown"],
    ["::ffff:203.0.113.7", "203.0.113.7"],
    ["::1", "0:0:0:0"],
    ["2001:db8:1:2:3:4:5:6", "2001:db8:1:2"],
    ["2001:db8:1:2::9", "2001:db8:1:2"],
    ["2001:0DB8:0001:0002:ffff::", "2001:db8:1:2"],
    ["2001:db8::", "2001:db8:0:0"],
    ["2001:db8::1:2:3:4", "2001:db8:0:0"],
    ["64:ff9b::203.0.113.7", "64:ff9b:0:0"],
    ["fe80::1%eth0", "fe80:0:0:0"],
  ])("counts %s as %s", (address, place) => {
    expect(placeOf(address)).toBe(place);
  });
});
