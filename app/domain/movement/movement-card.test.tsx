import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { placeFor } from "#app/domain/moisture/places.ts";
import { type ShopView, ShopViewProvider } from "#app/domain/shop/shop-view.tsx";
import { boardMovement } from "./board-movement.ts";
import { MovementCard } from "./movement-card.tsx";

const view: ShopView = {
  name: "Shop",
  units: "in",
  currency: "USD",
  classLimits: { flatBelowDeg: 30, quarteredAboveDeg: 60 },
  role: "helper",
};
const place = placeFor("most-of-us", { targetHumidityPct: 40, targetTemperatureC: 20 });
const board = { species: "white-oak", widthMm: 203.2, thicknessMm: 25.4, moisturePct: 12 };
const rings = fieldFromPith(board, { xMm: 101.6, yMm: 120 });

function card(given: Partial<Parameters<typeof boardMovement>[0]>): string {
  const movement = boardMovement({ ...board, rings, ...given }, place);
  return renderToStaticMarkup(
    <ShopViewProvider value={view}>
      <MovementCard species="white-oak" movement={movement} />
    </ShopViewProvider>,
  );
}

test("a read board is drawn, the exaggeration said, with its table and how well that is known", () => {
  const html = card({});
  expect(html).toMatch(/<svg[^>]*role="img"/);
  expect(html).toMatch(/drawn \d+ times too large/);
  expect(html).toContain("Table 13-5");
  expect(html).toMatch(/bark face hollow/);
});

test("a board nobody has read is not drawn: no grain is invented, and the extremes are named", () => {
  const html = card({ rings: null });
  expect(html).not.toContain("<svg");
  expect(html).toContain("all flat");
  expect(html).toContain("all quartered");
});

test("a board nobody has metered says what to do", () => {
  expect(card({ moisturePct: null })).toContain("Meter it first");
});
