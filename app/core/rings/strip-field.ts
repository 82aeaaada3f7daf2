import { axialMean } from "./angle.ts";
import { ringDirection } from "./direction.ts";
import type { RingField, RingStation } from "./ring-types.ts";

const samplesAcross = 5;
const samplesDown = 7;

/**
 * The rings of a strip ripped from a board's end: what is theirs of the board's own reading, on the strip's own stations.
 *
 * @param fromMm where the strip begins, across from the board's left edge; `toMm` where it ends.
 * @throws RangeError for a strip that does not lie on the end.
 */
export function stripField(field: RingField, fromMm: number, toMm: number): RingField {
  const slackMm = 0.5;
  if (!(fromMm >= -slackMm && toMm <= field.widthMm + slackMm && toMm - fromMm > 1))
    throw new RangeError(`A strip lies within 0 to ${field.widthMm} mm across; got ${fromMm} to ${toMm}.`);
  const widthMm = toMm - fromMm;
  const direction = ringDirection(field);
  const count = field.stations.length;
  const stations = Array.from({ length: count }, (_, i): RingStation => {
    const samples: number[] = [];
    for (let a = 0; a < samplesAcross; a++)
      for (let d = 0; d < samplesDown; d++)
        samples.push(
          direction({
            xMm: fromMm + (widthMm * (i + (a + 0.5) / samplesAcross)) / count,
            yMm: (field.thicknessMm * (d + 0.5)) / samplesDown,
          }),
        );
    const position = (i + 0.5) / count;
    return {
      position,
      signedDeg: axialMean(samples).signedDeg,
      angleDeg: samples.reduce((sum, deg) => sum + Math.abs(deg), 0) / samples.length,
      confidence: confidenceAt(field, (fromMm + position * widthMm) / field.widthMm),
    };
  });
  return { ...field, widthMm, stations, pith: field.pith && { xMm: field.pith.xMm - fromMm, yMm: field.pith.yMm } };
}

function confidenceAt(field: RingField, position: number): number {
  const near = field.stations.reduce((best, station) =>
    Math.abs(station.position - position) < Math.abs(best.position - position) ? station : best,
  );
  return near.confidence;
}
