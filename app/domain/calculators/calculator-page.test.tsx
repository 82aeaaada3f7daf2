import { renderToStaticMarkup } from "react-dom/server";
import { createMemoryRouter, RouterProvider } from "react-router";
import { describe, expect, test } from "vitest";
import { type ShopView, ShopViewProvider } from "#app/domain/shop/shop-view.tsx";
import { airFormula, airSources, askAir } from "./air.ts";
import { AirResult } from "./air-result.tsx";
import { CalculatorPage } from "./calculator-page.tsx";
import { calculators } from "./calculators.ts";
import { NumberBox } from "./inputs.tsx";
import { aShopLike, boxes } from "./shop.fixture.ts";

const view: ShopView = {
  name: "Shop",
  units: "in",
  currency: "USD",
  classLimits: { flatBelowDeg: 30, quarteredAboveDeg: 60 },
  role: "maker",
};

/** The air page as the server sends it, with these boxes in its address. */
function page(given: Record<string, string>): string {
  const asked = askAir(boxes(given), aShopLike());
  const element = (
    <ShopViewProvider value={view}>
      <CalculatorPage
        calculator={calculators.air}
        asked={asked}
        formula={airFormula("in")}
        sources={airSources}
        result={(answer) => <AirResult answer={answer} />}
      >
        <NumberBox asked={asked} name="temperature" label="Temperature of the air" />
        <NumberBox asked={asked} name="humidity" label="Relative humidity" />
        <NumberBox asked={asked} name="moisture" label="Moisture of the wood" />
      </CalculatorPage>
    </ShopViewProvider>
  );
  const router = createMemoryRouter([{ path: "*", element }], { initialEntries: ["/calculators/air"] });
  return renderToStaticMarkup(<RouterProvider router={router} />);
}

describe("the frame of a calculator", () => {
  test("sends its boxes by GET to its own address, down to the answer", () => {
    const form = /<form[^>]*>/.exec(page({}))?.[0];
    expect(form).toContain('method="get"');
    expect(form).toContain('action="/calculators/air#result"');
  });

  test("shows answer, plot, formula and sources with how well each is known", () => {
    const html = page({ temperature: "70", humidity: "50" });
    // Wood Handbook Table 4-2.
    expect(html).toContain("9.2 %");
    expect(html).toMatch(/<svg[^>]*role="img"/);
    expect(html).toContain("EMC % = 1800/W");
    expect(html).toContain("Eq. 4-5");
    expect(html).toContain("from memory: check it");
  });

  test("a wrong figure stays in its box, its message tied to it, and no answer is shown", () => {
    const html = page({ humidity: "140" });
    expect(html).toMatch(/<input[^>]*id="humidity"[^>]*value="140"/);
    expect(html).toMatch(/aria-invalid="true"/);
    expect(html).toMatch(/id="humidity-wrong"[^>]*>Give the relative humidity as a number from 0 to 100 %\./);
    expect(html).toContain("Something typed will not do");
    expect(html).not.toContain("<svg");
  });

  test("what lies outside the published range is said beside the figure", () => {
    expect(page({ temperature: "0", humidity: "50" })).toContain("The published table begins at 30 °F");
  });

  test("typed markup is shown as text", () => {
    expect(page({ humidity: "<script>alert(1)</script>" })).not.toContain("<script>");
  });
});
