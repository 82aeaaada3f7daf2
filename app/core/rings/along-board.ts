import { foldDeg } from "./angle.ts";
import type { RingField, RingStation } from "./ring-types.ts";

/**
 * The far end as one would see it through the board from the near end: left and right change places, and a ring that fell to the right falls to the left.
 */
export function seenFromNear(far: RingField): RingField {
  return {
    ...far,
    stations: far.stations
      .map((station) => ({ ...station, position: 1 - station.position, signedDeg: foldDeg(-station.signedDeg) }))
      .reverse(),
    pith: far.pith && { xMm: far.widthMm - far.pith.xMm, yMm: far.pith.yMm },
  };
}

/**
 * The rings at a place along a board whose ends were read apart: each station turns evenly, the short way round, from what the near end shows to what
 * the far end shows. A straight line between two readings is all that two readings can tell.
 *
 * @param near as read, seen from the near end.
 * @param far as read, seen from the far end; as many stations as the near end has.
 * @param share of the length from the near end, 0 to 1.
 * @throws RangeError for a share outside 0 to 1 or ends with different numbers of stations.
 */
export function fieldAlong(near: RingField, far: RingField, share: number): RingField {
  if (!(share >= 0 && share <= 1)) throw new RangeError(`A share of the length is 0 to 1; got ${share}.`);
  if (near.stations.length !== far.stations.length) throw new RangeError("Both ends need the same number of stations.");
  const turned = seenFromNear(far);
  const stations = near.stations.map((station, i): RingStation => {
    const other = turned.stations[i] as RingStation;
    const signedDeg = foldDeg(station.signedDeg + share * foldDeg(other.signedDeg - station.signedDeg));
    return {
      position: station.position,
      signedDeg,
      angleDeg: Math.min(90, Math.abs(signedDeg)),
      confidence: Math.min(station.confidence, other.confidence),
    };
  });
  const pith =
    near.pith && turned.pith
      ? {
          xMm: near.pith.xMm + share * (turned.pith.xMm - near.pith.xMm),
          yMm: near.pith.yMm + share * (turned.pith.yMm - near.pith.yMm),
        }
      : null;
  const perInch =
    near.ringsPerInch !== null && far.ringsPerInch !== null
      ? near.ringsPerInch + share * (far.ringsPerInch - near.ringsPerInch)
      : null;
  return { ...near, stations, pith, ringsPerInch: perInch };
}

export interface EndsCompared {
  /** Mean over the width of how far the rings turn from one end to the other, without regard to side. */
  turnDeg: number;
  /** The same with its side: where all stations turn alike the board was sawn out of the tree's line, or the tree twists. */
  meanTurnDeg: number;
}

/** How much the rings differ between a board's two ends, the far one read from the far end. */
export function compareEnds(near: RingField, far: RingField): EndsCompared {
  const turned = seenFromNear(far);
  const turns = near.stations.map((station, i) =>
    foldDeg((turned.stations[i]?.signedDeg ?? station.signedDeg) - station.signedDeg),
  );
  const mean = (values: number[]) => values.reduce((a, b) => a + b, 0) / values.length;
  return { turnDeg: mean(turns.map(Math.abs)), meanTurnDeg: mean(turns) };
}
