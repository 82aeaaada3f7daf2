import { requireWithin } from "./accepted-range.ts";

/** The moisture that wood settles at, percent of ovendry mass. `outsideRange` says where the published table ends. */
export interface EquilibriumMoisture {
  moisturePct: number;
  outsideRange: string | null;
}

/** The air humidity that would hold wood at a moisture. */
export interface EquilibriumHumidity {
  humidityPct: number;
  outsideRange: string | null;
}

interface Coefficients {
  w: readonly [number, number, number];
  k: readonly [number, number, number];
  k1: readonly [number, number, number];
  k2: readonly [number, number, number];
}

// Wood Handbook (2021) Eq. 4-5, Simpson 1973 [confirmed].
const celsius: Coefficients = {
  w: [349, 1.29, 0.0135],
  k: [0.805, 0.000736, -0.00000273],
  k1: [6.27, -0.00938, -0.000303],
  k2: [1.91, 0.0407, -0.000293],
};

// The same in degrees Fahrenheit [secondary]. Public code exists with 0.0171 in place of 0.0284 in K2: that is wrong.
const fahrenheit: Coefficients = {
  w: [330, 0.452, 0.00415],
  k: [0.791, 0.000463, -0.000000844],
  k1: [6.34, 0.000775, -0.0000935],
  k2: [1.09, 0.0284, -0.0000904],
};

/**
 * Equilibrium moisture of wood in air of `humidityPct` (0-100) at `temperatureC` (-30 to 120), by the two-hydrate
 * Hailwood-Horrobin equation, Wood Handbook (2021) Eq. 4-5. One curve serves all species and ignores hysteresis: wood
 * that is drying sits 1-2 points above wood that is wetting. RangeError outside the accepted figures.
 */
export function equilibriumMoistureC(humidityPct: number, temperatureC: number): EquilibriumMoisture {
  requireWithin("Relative humidity", humidityPct, 0, 100, "%");
  requireWithin("Temperature", temperatureC, -30, 120, "°C");
  return {
    moisturePct: hailwoodHorrobin(humidityPct / 100, temperatureC, celsius),
    outsideRange: beyondTable(humidityPct, temperatureC),
  };
}

/** As `equilibriumMoistureC`, with the temperature in °F (-22 to 248) and the Fahrenheit coefficients. */
export function equilibriumMoistureF(humidityPct: number, temperatureF: number): EquilibriumMoisture {
  requireWithin("Relative humidity", humidityPct, 0, 100, "%");
  requireWithin("Temperature", temperatureF, -22, 248, "°F");
  return {
    moisturePct: hailwoodHorrobin(humidityPct / 100, temperatureF, fahrenheit),
    outsideRange: beyondTable(humidityPct, toCelsius(temperatureF)),
  };
}

/**
 * The relative humidity (0-100) whose equilibrium is `moisturePct` at `temperatureC`: the inverse of
 * `equilibriumMoistureC`, by bisection. RangeError where no humidity up to 100 % gives that moisture.
 */
export function humidityForMoistureC(moisturePct: number, temperatureC: number): EquilibriumHumidity {
  const wettest = equilibriumMoistureC(100, temperatureC).moisturePct;
  requireWithin("Moisture", moisturePct, 0, round(wettest), "% at this temperature");
  const humidityPct = 100 * bisect((h) => hailwoodHorrobin(h, temperatureC, celsius), moisturePct);
  return { humidityPct, outsideRange: beyondTable(humidityPct, temperatureC) };
}

/** As `humidityForMoistureC`, with the temperature in °F. */
export function humidityForMoistureF(moisturePct: number, temperatureF: number): EquilibriumHumidity {
  const wettest = equilibriumMoistureF(100, temperatureF).moisturePct;
  requireWithin("Moisture", moisturePct, 0, round(wettest), "% at this temperature");
  const humidityPct = 100 * bisect((h) => hailwoodHorrobin(h, temperatureF, fahrenheit), moisturePct);
  return { humidityPct, outsideRange: beyondTable(humidityPct, toCelsius(temperatureF)) };
}

function hailwoodHorrobin(h: number, temperature: number, { w, k, k1, k2 }: Coefficients): number {
  const at = ([a, b, c]: readonly [number, number, number]) => a + b * temperature + c * temperature * temperature;
  const kh = at(k) * h;
  const first = at(k1) * kh;
  const second = first * at(k2) * kh;
  return (1800 / at(w)) * (kh / (1 - kh) + (first + 2 * second) / (1 + first + second));
}

// Table 4-2 runs from 30 to 270 °F and from 5 to 95 % [memory].
function beyondTable(humidityPct: number, temperatureC: number): string | null {
  if (humidityPct < 5 || humidityPct > 95) return "The published table runs from 5 to 95 % relative humidity.";
  if (temperatureC < -1.12 || temperatureC > 132.3) return "The published table begins at 30 °F (-1 °C).";
  return null;
}

function bisect(rising: (h: number) => number, target: number): number {
  let [low, high] = [0, 1];
  for (let step = 0; step < 60; step += 1) {
    const middle = (low + high) / 2;
    if (rising(middle) < target) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

const toCelsius = (temperatureF: number) => ((temperatureF - 32) * 5) / 9;
const round = (value: number) => Math.floor(value * 10) / 10;
