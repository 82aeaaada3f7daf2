import { describe, expect, test } from "vitest";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { listMoistureReadings } from "#app/domain/moisture/moisture.sql.server.ts";
import { contextFor, statusFrom } from "#tests/factories/at-work.ts";
import { aBoard } from "#tests/factories/board.ts";
import { anActor, aShop } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { loader as boardPage } from "./board.tsx";
import { action } from "./moisture.tsx";

describe("taking a reading at the rack", () => {
  const db = useTestDb();

  async function scene(units: "in" | "mm" = "in") {
    const joel = await anActor(db(), "helper", { shopId: await aShop(db(), { units }) });
    const board = await aBoard(db(), joel);
    const take = async (typed: Record<string, string>, boardId = board.id) => {
      const request = new Request("http://shop.example/", { method: "POST", body: new URLSearchParams(typed) });
      const args = { request, params: { boardId }, context: await contextFor(db(), joel) };
      return statusFrom(() => action(args as never));
    };
    return { joel, board, take };
  }

  test("a cold board's reading is kept corrected, the meter's own figure beside it (Wood Handbook 2010 ch. 13: 12 at 40 °F is 13.5)", async () => {
    const { joel, board, take } = await scene();
    expect(await take({ meterPct: "12", meter: "pin", woodTemperatureC: "40", place: "middle" })).toBe(302);
    const [reading] = await listMoistureReadings(db(), joel, board.id);
    expect(reading).toMatchObject({ moisturePct: 13.5, meterPct: 12, meter: "pin", woodTemperatureC: 4.4 });
    expect((await getBoard(db(), joel, board.id))?.moisturePct).toBe(13.5);
  });

  test("a metric shop types °C; a pinless meter is kept as read", async () => {
    const { joel, board, take } = await scene("mm");
    await take({ meterPct: "11.2", meter: "pinless", woodTemperatureC: "5" });
    const [reading] = await listMoistureReadings(db(), joel, board.id);
    expect(reading).toMatchObject({ moisturePct: 11.2, meterPct: 11.2, woodTemperatureC: 5 });
  });

  test.each([
    [{ meterPct: "12", meter: "pin", woodTemperatureC: "warm" }, 400],
    [{ meterPct: "201", meter: "pin" }, 400],
    [{ meterPct: "12", meter: "tongue" }, 400],
    [{ meterPct: "200", meter: "pin", woodTemperatureC: "-20" }, 302],
  ])("%j answers %d", async (typed, status) => {
    const { take } = await scene();
    expect(await take(typed as Record<string, string>)).toBe(status);
  });

  test("another shop's board is not there", async () => {
    const { take } = await scene();
    const elsewhere = await aBoard(db(), await anActor(db(), "maker"));
    expect(await take({ meterPct: "12", meter: "pin" }, elsewhere.id)).toBe(404);
  });

  test("the board's page works its readings out for the place in its address, and for the shop where that is none", async () => {
    const { joel, board, take } = await scene();
    await take({ meterPct: "12", meter: "pin", woodTemperatureC: "70" });
    const page = async (search: string) =>
      boardPage({
        params: { boardId: board.id },
        url: new URL(`http://shop.example/${search}`),
        context: await contextFor(db(), joel),
      } as never);
    const { worked } = await page("?place=dry-southwest");
    expect(worked.readiness?.place.name).toBe("dry-southwest");
    expect(worked.movement.ok && worked.movement.isRange).toBe(true);
    expect(worked.weight?.massKg).toBeGreaterThan(5);
    expect((await page("?place=%00")).worked.readiness?.place.name).toBe("this-shop");
  });
});
