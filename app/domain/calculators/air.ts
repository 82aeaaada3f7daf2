import { z } from "zod";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import {
  equilibriumMoistureC,
  equilibriumMoistureF,
  humidityForMoistureC,
  humidityForMoistureF,
} from "#app/core/moisture/emc.ts";
import { shopTarget } from "#app/core/moisture/interior-targets.ts";
import { shopDegrees, temperatureField, typedTemperature } from "#app/domain/moisture/temperature.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { optionalNumberField } from "./number-field.ts";

export type AirBox = "temperature" | "humidity" | "moisture";

export interface AirAnswer {
  temperatureC: number;
  /** What the humidity typed holds wood at; null where none was typed. */
  settles: { humidityPct: number; moisturePct: number; outsideRange: string | null } | null;
  /** The humidity that the moisture typed means; null where none was typed. */
  means: { humidityPct: number; moisturePct: number; outsideRange: string | null } | null;
  /** The whole curve at this temperature, [humidity, moisture]. */
  curve: [number, number][];
  shop: { targetPct: number; tolerancePct: number };
}

const schema = (units: LengthUnit) =>
  z
    .object({
      temperature: temperatureField(units, { name: "temperature", leastC: -30, mostC: 120 }),
      humidity: optionalNumberField({ name: "relative humidity", least: 0, most: 100, unit: "%" }),
      moisture: optionalNumberField({ name: "moisture", least: 0, most: 40, unit: "%" }),
    })
    .refine(({ humidity, moisture }) => humidity !== null || moisture !== null, {
      path: ["humidity"],
      error: "Give a humidity, a moisture, or both.",
    });

/** Air and wood both ways, from the page's address. Inch shops use the published °F coefficients, others the °C ones. */
export function askAir(params: URLSearchParams, shop: ShopForCalculators): Asked<AirBox, AirAnswer> {
  const { units } = shop;
  const start = {
    temperature: inUnits(units, "70", typedTemperature(shop.targetTemperatureC, "mm")),
    humidity: "50",
    moisture: "",
  };
  return ask(params, start, schema(units), ({ temperature, humidity, moisture }) => {
    const degrees = shopDegrees(temperature, units);
    const settle = units === "in" ? equilibriumMoistureF : equilibriumMoistureC;
    const mean = units === "in" ? humidityForMoistureF : humidityForMoistureC;
    const { targetPct, tolerancePct } = shopTarget(shop.targetHumidityPct, shop.targetTemperatureC);
    return {
      temperatureC: temperature,
      settles: humidity === null ? null : { humidityPct: humidity, ...settle(humidity, degrees) },
      means: moisture === null ? null : { moisturePct: moisture, ...mean(moisture, degrees) },
      curve: Array.from({ length: 47 }, (_, i) => [2 + 2 * i, settle(2 + 2 * i, degrees).moisturePct]),
      shop: { targetPct, tolerancePct },
    };
  });
}

/** The equation with the coefficients of the shop's thermometer. */
export function airFormula(units: LengthUnit): string[] {
  const coefficients =
    units === "in"
      ? [
          "T in °F: W = 330 + 0.452 T + 0.00415 T²; K = 0.791 + 0.000463 T − 0.000000844 T²",
          "K₁ = 6.34 + 0.000775 T − 0.0000935 T²; K₂ = 1.09 + 0.0284 T − 0.0000904 T²",
        ]
      : [
          "T in °C: W = 349 + 1.29 T + 0.0135 T²; K = 0.805 + 0.000736 T − 0.00000273 T²",
          "K₁ = 6.27 − 0.00938 T − 0.000303 T²; K₂ = 1.91 + 0.0407 T − 0.000293 T²",
        ];
  return [
    "EMC % = 1800/W × [ Kh/(1 − Kh) + (K₁Kh + 2 K₁K₂K²h²) / (1 + K₁Kh + K₁K₂K²h²) ], h = humidity ÷ 100",
    ...coefficients,
    "back from moisture to humidity by halving the interval until the equation gives that moisture",
  ];
}

export const airSources: Source[] = [
  {
    of: "Equilibrium moisture (Hailwood–Horrobin, two hydrates)",
    text: "Wood Handbook FPL-GTR-282 (2021), Eq. 4-5, after Simpson 1973",
    confidence: "confirmed",
  },
  { of: "The same in °F", text: "agrees with the °C set by substitution", confidence: "confirmed-secondary" },
  { of: "The table it was published for, 30 °F up, 5 to 95 %", text: "Wood Handbook, Table 4-2", confidence: "memory" },
  {
    of: "One curve for all species; drying wood stops 1 to 2 points above wetting wood",
    text: "Wood Handbook; Glass, Zelinka and Johnson, FPL-GTR-229 (2014)",
    confidence: "confirmed",
  },
];
