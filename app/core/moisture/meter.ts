import { requireMoisture, requireWithin } from "./accepted-range.ts";

/** Pin (conductance), pinless (dielectric), or an ovendry test. */
export type Meter = "pin" | "pinless" | "oven";

export interface MeterReading {
  /** What the instrument showed, percent. */
  meterPct: number;
  meter: Meter;
  /** Temperature of the wood, not of the air; null where it was not taken. */
  woodTemperatureC: number | null;
  /** Temperature the meter is calibrated for; 70 °F (21.1 °C) unless its maker says otherwise. */
  calibrationTemperatureC?: number;
}

/** A reading after correction, with every caution that belongs beside it. */
export interface CorrectedReading {
  moisturePct: number;
  /** Points added to the reading; negative for warm wood. */
  correctionPct: number;
  /** What was corrected and what was not, in a sentence for the screen. */
  explanation: string;
  outsideRange: string | null;
}

/** 0.5 points per 10 °F, Wood Handbook (2010) ch. 13 [confirmed], as points per °C. */
const pointsPerC = 0.5 / (10 / 1.8);

/**
 * Corrects a meter reading for the temperature of the wood: pin meters by 0.5 points per 10 °F, added when the wood is
 * colder than the calibration and taken off when it is warmer (Wood Handbook 2010, ch. 13). Pinless meters and ovendry
 * tests are returned as read. No species table is built in, because none of the published ones could be seen: the
 * meter's own species setting or its maker's table is to be applied before the reading is entered.
 * RangeError for a moisture outside 0-600 % or a wood temperature outside -40 to 80 °C.
 */
export function correctMeterReading(reading: MeterReading): CorrectedReading {
  const { meterPct, meter, woodTemperatureC, calibrationTemperatureC = 21.1 } = reading;
  requireMoisture("Meter reading", meterPct);
  if (woodTemperatureC !== null) requireWithin("Wood temperature", woodTemperatureC, -40, 80, "°C");
  requireWithin("Calibration temperature", calibrationTemperatureC, 0, 40, "°C");
  const correctable = meter === "pin" && woodTemperatureC !== null;
  const wanted = correctable ? (calibrationTemperatureC - woodTemperatureC) * pointsPerC : 0;
  const moisturePct = Math.max(0, meterPct + wanted);
  return {
    moisturePct,
    correctionPct: moisturePct - meterPct,
    explanation: explain(meter, correctable),
    outsideRange: beyondMeter(meter, meterPct, woodTemperatureC),
  };
}

function explain(meter: Meter, corrected: boolean): string {
  if (meter === "oven") return "Ovendry test: nothing to correct.";
  if (meter === "pinless") {
    return "As read. Set a pinless meter to the wood's specific gravity; newer ones correct temperature themselves.";
  }
  const species = "Species is not corrected here: use the meter's species setting or its maker's table.";
  const temperature = corrected
    ? "Corrected for wood temperature, 0.5 points per 10 °F."
    : "Not corrected: the wood's temperature was not taken.";
  return `${temperature} ${species}`;
}

function beyondMeter(meter: Meter, meterPct: number, woodTemperatureC: number | null): string | null {
  if (meter === "oven") return null;
  if (meterPct > 30) return "Hand meters follow moisture only below about 30 %.";
  // Dielectric 4-30 % [confirmed, Wood Handbook 2010 ch. 13]; pins unreliable below 6-7 % [secondary].
  if (meter === "pinless" && meterPct < 4) return "Pinless meters are reliable from about 4 %.";
  if (meter === "pin" && meterPct < 7) return "Pin meters are unreliable below about 6 to 7 %.";
  if (woodTemperatureC !== null && woodTemperatureC < 0) return "Frozen wood: hand meters cannot be relied on.";
  return null;
}
