import {
  normalRad,
  type Place,
  type RingCentre,
  ringCentre,
  ringLevel,
  stepped,
  type TangentPlane,
  tangentPlane,
} from "./ring-levels.ts";

/** Rings round one centre, fitted to strokes. Lengths in half diagonals of the end. */
export interface RingFit {
  centre: RingCentre;
  /** Distance of the strokes' points from their rings, root mean square: over all, and stroke by stroke. */
  residual: number;
  strokeResiduals: number[];
  /** How sure the direction of the ring is at a place: standard deviation, radians. */
  directionSd(place: Place): number;
}

/**
 * Distances of the centre that the search starts from, once each, at the best bearing; 1 is a corner of the end. Upright strokes have a false best
 * in the board's middle, which a search from the cheapest few starts alone falls into.
 */
const startDistances = [0, 0.2, 0.4, 0.6, 0.8, 1, 1.3, 1.7, 2.3, 3.2, 5, 10, 1e6];
const startBearings = 24;
const rounds = 25;

/**
 * A hand follows a ring with a few slow errors, not with one at every point: a stroke counts as this many independent points, however finely it
 * was recorded.
 */
const pointsPerStroke = 5;
/** A point further off than this many times the noise loses its say, so that one stroke along a ray does not bend the others. */
const tolerance = 2.5;
/** What a pith in the middle of the end costs over straight rings: little enough to give way to what the strokes say. */
const preferStraight = 0.1;

/**
 * The centre whose circles the strokes follow best, each on a ring of its own: least squares of the distances, with a bounded pull (Cauchy's) for
 * points that fit nowhere, and a slight preference for straight rings where the strokes do not tell.
 *
 * @param strokes points in half diagonals from the end's middle, evenly spaced along each.
 * @param noise how far a hand strays from a ring, in half diagonals.
 */
export function fitRings(strokes: Place[][], noise: number): RingFit {
  const candidates = startDistances.map((distance) => {
    const start = cheapest(starts(distance).map((centre) => ({ centre, cost: cost(strokes, centre, noise) })));
    return refine(strokes, start.centre, noise);
  });
  const best = cheapest(candidates);
  const seen = residuals(strokes, best.centre);
  const rms = (values: number[]) => Math.sqrt(values.reduce((sum, e) => sum + e * e, 0) / values.length);
  const residual = rms(seen.flat());
  const spread = covariance(strokes, best.centre, Math.max(noise, residual));
  return {
    centre: best.centre,
    residual,
    strokeResiduals: seen.map(rms),
    directionSd: (place) => directionSd(best.centre, spread, place),
  };
}

interface Candidate {
  centre: RingCentre;
  cost: number;
}

function cheapest(candidates: Candidate[]): Candidate {
  return candidates.reduce((one, other) => (other.cost < one.cost ? other : one));
}

function starts(distance: number): RingCentre[] {
  return Array.from({ length: distance === 0 ? 1 : startBearings }, (_, i) => {
    const bearing = (2 * Math.PI * i) / startBearings;
    return ringCentre(distance * Math.cos(bearing), distance * Math.sin(bearing), 1);
  });
}

/** Distance of each point from the mean ring of its stroke. */
function residuals(strokes: Place[][], centre: RingCentre): number[][] {
  return strokes.map((stroke) => {
    const levels = stroke.map((place) => ringLevel(centre, place));
    const mean = levels.reduce((sum, level) => sum + level, 0) / levels.length;
    return levels.map((level) => level - mean);
  });
}

function cost(strokes: Place[][], centre: RingCentre, noise: number): number {
  const scale = tolerance * noise;
  let sum = preferStraight * centre.w ** 2;
  for (const stroke of residuals(strokes, centre))
    for (const e of stroke) sum += (pointsPerStroke / stroke.length) * tolerance ** 2 * Math.log1p((e / scale) ** 2);
  return sum;
}

function refine(strokes: Place[][], start: RingCentre, noise: number): Candidate {
  let best = { centre: start, cost: cost(strokes, start, noise) };
  let damping = 1e-3;
  for (let round = 0; round < rounds && damping < 1e6; round++) {
    const plane = tangentPlane(best.centre);
    const { h, g } = normalEquations(strokes, best.centre, plane, noise);
    const [h11, h12, h22] = [h[0] * (1 + damping), h[1], h[2] * (1 + damping)];
    const det = h11 * h22 - h12 * h12;
    const [s, t] = [-(h22 * g[0] - h12 * g[1]) / det, -(h11 * g[1] - h12 * g[0]) / det];
    const centre = stepped(best.centre, plane, s, t);
    const next = cost(strokes, centre, noise);
    if (!(next < best.cost)) {
      damping *= 10;
      continue;
    }
    best = { centre, cost: next };
    damping = Math.max(damping / 10, 1e-9);
    if (Math.hypot(s, t) < 1e-10) break;
  }
  return best;
}

type Symmetric = [number, number, number];

/** Step of the numerical derivatives on the sphere of centres. */
const small = 1e-6;

/** Gauss–Newton: half the second derivatives and the gradient of `cost` in the plane of small steps, weights held. */
function normalEquations(
  strokes: Place[][],
  centre: RingCentre,
  plane: TangentPlane,
  noise: number,
): { h: Symmetric; g: [number, number] } {
  const here = residuals(strokes, centre);
  const there = residuals(strokes, stepped(centre, plane, small, 0));
  const beside = residuals(strokes, stepped(centre, plane, 0, small));
  const [, e2] = plane;
  // The preference for straight rings makes w a residual; only e2 changes it.
  const h: Symmetric = [0, 0, preferStraight * e2.w * e2.w];
  const g: [number, number] = [0, preferStraight * centre.w * e2.w];
  here.forEach((stroke, i) => {
    stroke.forEach((e, j) => {
      const weight = pointsPerStroke / stroke.length / noise ** 2 / (1 + (e / (tolerance * noise)) ** 2);
      const ds = (there[i]![j]! - e) / small;
      const dt = (beside[i]![j]! - e) / small;
      h[0] += weight * ds * ds;
      h[1] += weight * ds * dt;
      h[2] += weight * dt * dt;
      g[0] += weight * ds * e;
      g[1] += weight * dt * e;
    });
  });
  return { h, g };
}

function covariance(strokes: Place[][], centre: RingCentre, noise: number): Symmetric {
  const { h } = normalEquations(strokes, centre, tangentPlane(centre), noise);
  // A centre is never less sure than "anywhere within a radian of here".
  const [h11, h12, h22] = [h[0] + 1, h[1], h[2] + 1];
  const det = h11 * h22 - h12 * h12;
  return [h22 / det, -h12 / det, h11 / det];
}

function directionSd(centre: RingCentre, [c11, c12, c22]: Symmetric, place: Place): number {
  const plane = tangentPlane(centre);
  const here = normalRad(centre, place);
  const turn = (s: number, t: number) => {
    const by = normalRad(stepped(centre, plane, s, t), place) - here;
    return (by - Math.PI * Math.round(by / Math.PI)) / small;
  };
  const [ds, dt] = [turn(small, 0), turn(0, small)];
  return Math.sqrt(Math.max(0, c11 * ds * ds + 2 * c12 * ds * dt + c22 * dt * dt));
}
