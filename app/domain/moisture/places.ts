import { equilibriumMoistureC } from "#app/core/moisture/emc.ts";
import { type MoistureTarget, regionTarget, regionTargets, shopTarget } from "#app/core/moisture/interior-targets.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";

export const placeNames = ["this-shop", "heated-room", "most-of-us", "dry-southwest", "damp-coast"] as const;
export type PlaceName = (typeof placeNames)[number];

/** Where a piece will live: what its wood should hold when it is made, and how far it will go in the driest and dampest season there. */
export interface Place {
  name: PlaceName;
  words: string;
  target: MoistureTarget;
  driestPct: number;
  dampestPct: number;
  /** Where the target comes from, and where the seasons' figures do, each in a sentence. */
  targetSource: string;
  seasonSource: string;
}

/** Rooms heated in winter and open in summer. Humidities as common practice, no source. */
const heated = { winterC: 20, winterPct: 30, summerC: 24, summerPct: 60 };

/** A place by name, for a shop that keeps its own air. */
export function placeFor(name: PlaceName, shop: Pick<ShopSettings, "targetHumidityPct" | "targetTemperatureC">): Place {
  const emc = (humidityPct: number, celsius: number) => equilibriumMoistureC(humidityPct, celsius).moisturePct;
  const here = shopTarget(shop.targetHumidityPct, shop.targetTemperatureC);
  if (name === "this-shop") {
    const drier = Math.max(5, shop.targetHumidityPct - 10);
    const damper = Math.min(95, shop.targetHumidityPct + 10);
    return {
      name,
      words: "this shop",
      target: here,
      driestPct: emc(drier, shop.targetTemperatureC),
      dampestPct: emc(damper, shop.targetTemperatureC),
      targetSource: "What this air holds wood at: Wood Handbook Eq. 4-5; within 1 point is common practice.",
      seasonSource: "The shop's own air, 10 % humidity drier and damper (common practice, no source).",
    };
  }
  if (name === "heated-room") {
    const driestPct = emc(heated.winterPct, heated.winterC);
    const dampestPct = emc(heated.summerPct, heated.summerC);
    const targetPct = (driestPct + dampestPct) / 2;
    return {
      name,
      words: "a heated room",
      target: { targetPct, tolerancePct: 1.5, words: "a heated room, between its seasons", outsideRange: null },
      driestPct,
      dampestPct,
      targetSource: "Midway between its seasons (common practice, no source).",
      seasonSource:
        "30 % humidity at 20 °C in winter, 60 % at 24 °C in summer (common practice, no source); Wood Handbook Eq. 4-5.",
    };
  }
  const region = regionTargets.find((row) => row.region === name);
  if (!region) throw new RangeError(`No region is called ${name}.`);
  const seen =
    region.confidence.pieces === "memory" ? "from memory: check it" : "seen as another publication quotes it";
  return {
    name,
    words: `indoors, ${region.name}`,
    target: regionTarget(region.region),
    driestPct: region.interior.lowPct,
    dampestPct: region.interior.highPct,
    targetSource: `Range for single pieces: ${region.source} (${seen}).`,
    seasonSource: `Range for single pieces: ${region.source} (${seen}).`,
  };
}

/** A place's name from an address; the shop itself where it is none. */
export function readPlace(typed: string | null): PlaceName {
  return placeNames.find((name) => name === typed) ?? "this-shop";
}

/** What a choice of places calls each. */
export const placeWords: Record<PlaceName, string> = {
  "this-shop": "this shop",
  "heated-room": "a room heated in winter",
  "most-of-us": "indoors, most of the United States",
  "dry-southwest": "indoors, dry Southwest",
  "damp-coast": "indoors, damp warm coast",
};
