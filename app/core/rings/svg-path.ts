import type { RingCurve } from "./ring-curves.ts";

interface Place {
  x: number;
  y: number;
}

interface Scale {
  x: number;
  y: number;
}

/** Of the spacing between rings: how far a drawn ring may stray from the true one, and the coarsest last digit kept. */
const fine = 1 / 12;
const deepest = 6;

/**
 * Curves as one SVG path in as few bytes as may be: straight where straight is as good, a quadratic where that is, else an arc; relative, rounded, each
 * piece from the end nearer to where the last one stopped.
 *
 * @param scale drawing units to the millimetre, across and down.
 * @param spacing between rings in drawing units: sets how fine the path has to be.
 */
export function writeCurves(curves: RingCurve[], scale: Scale, spacing: number): string {
  const decimals = Math.min(3, Math.max(0, Math.ceil(-Math.log10(spacing * fine))));
  const pen = { unit: 10 ** decimals, x: 0, y: 0 };
  let d = "";
  for (const curve of curves) {
    const away = (share: number) => {
      const { xMm, yMm } = curve.at(share);
      return Math.abs(xMm * scale.x - pen.x / pen.unit) + Math.abs(yMm * scale.y - pen.y / pen.unit);
    };
    d += written(away(1) < away(0) ? reversed(curve) : curve, scale, spacing * fine, pen);
  }
  return d;
}

/** Where the pen is, in whole units of the last digit, so that rounding never adds up. */
interface Pen {
  unit: number;
  x: number;
  y: number;
}

function reversed({ at, arc }: RingCurve): RingCurve {
  return { at: (share) => at(1 - share), arc: arc && { radiusMm: arc.radiusMm, turnRad: -arc.turnRad } };
}

/** One curve, and the pen moved to its end. */
function written(curve: RingCurve, scale: Scale, stray: number, pen: Pen): string {
  const at = (share: number): Place => {
    const { xMm, yMm } = curve.at(share);
    return { x: xMm * scale.x, y: yMm * scale.y };
  };
  const start = at(0);
  let d = moved(pen, start);
  const piece = (low: number, high: number, depth: number): void => {
    const [a, quarter, mid, threeQuarters, b] = [0, 0.25, 0.5, 0.75, 1].map((s) => at(low + s * (high - low))) as [
      Place,
      Place,
      Place,
      Place,
      Place,
    ];
    const control = { x: 2 * mid.x - (a.x + b.x) / 2, y: 2 * mid.y - (a.y + b.y) / 2 };
    const isStraight = [quarter, mid, threeQuarters].every((p) => fromLine(p, a, b) < stray);
    const turn = (curve.arc?.turnRad ?? 0) * (high - low);
    // A quadratic through the middle of an arc of half angle h strays by about radius × h⁴ / 100.
    const isQuadratic = curve.arc
      ? Math.abs(turn) < 2.4 && (curve.arc.radiusMm * Math.max(scale.x, scale.y) * (turn / 2) ** 4) / 100 < stray
      : [quarter, threeQuarters].every((p, i) => distance(p, quadratic(a, control, b, 0.25 + i / 2)) < stray);
    if (isStraight) d += lined(pen, b);
    else if (isQuadratic) d += curved(pen, control, b);
    else if (curve.arc && Math.abs(turn) < 6) d += arced(pen, curve.arc.radiusMm, turn, scale, b);
    else if (depth >= deepest) d += lined(pen, b);
    else {
      piece(low, (low + high) / 2, depth + 1);
      piece((low + high) / 2, high, depth + 1);
    }
  };
  piece(0, 1, 0);
  return d;
}

function quadratic(a: Place, control: Place, b: Place, t: number): Place {
  const [p, q, r] = [(1 - t) ** 2, 2 * t * (1 - t), t * t];
  return { x: p * a.x + q * control.x + r * b.x, y: p * a.y + q * control.y + r * b.y };
}

function distance(a: Place, b: Place): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

function fromLine(p: Place, a: Place, b: Place): number {
  const length = distance(a, b);
  if (length < 1e-9) return distance(p, a);
  return Math.abs((p.x - a.x) * (b.y - a.y) - (p.y - a.y) * (b.x - a.x)) / length;
}

function moved(pen: Pen, to: Place): string {
  const [x, y] = [Math.round(to.x * pen.unit), Math.round(to.y * pen.unit)];
  const absolute = `M${numbers(pen.unit, x, y)}`;
  // The first move of a path counts from the corner either way.
  const relative = `m${numbers(pen.unit, x - pen.x, y - pen.y)}`;
  [pen.x, pen.y] = [x, y];
  return relative.length < absolute.length ? relative : absolute;
}

function lined(pen: Pen, to: Place): string {
  const [dx, dy] = stepTo(pen, to);
  if (dx === 0) return `v${numbers(pen.unit, dy)}`;
  return dy === 0 ? `h${numbers(pen.unit, dx)}` : `l${numbers(pen.unit, dx, dy)}`;
}

function curved(pen: Pen, control: Place, to: Place): string {
  const [cx, cy] = [Math.round(control.x * pen.unit) - pen.x, Math.round(control.y * pen.unit) - pen.y];
  const [dx, dy] = stepTo(pen, to);
  return `q${numbers(pen.unit, cx, cy, dx, dy)}`;
}

function arced(pen: Pen, radiusMm: number, turn: number, scale: Scale, to: Place): string {
  const radii = [radiusMm * scale.x * pen.unit, radiusMm * scale.y * pen.unit].map(Math.round);
  const [dx, dy] = stepTo(pen, to);
  const flags = `${Math.abs(turn) > Math.PI ? 1 : 0} ${turn > 0 ? 1 : 0}`;
  const step = numbers(pen.unit, dx, dy);
  return `a${numbers(pen.unit, ...radii)} 0 ${flags}${step.startsWith("-") ? "" : " "}${step}`;
}

function stepTo(pen: Pen, to: Place): [number, number] {
  const [x, y] = [Math.round(to.x * pen.unit), Math.round(to.y * pen.unit)];
  const step: [number, number] = [x - pen.x, y - pen.y];
  [pen.x, pen.y] = [x, y];
  return step;
}

/** Numbers as a path takes them: no zero before the point, a minus sign as its own separator. */
function numbers(unit: number, ...values: number[]): string {
  return values
    .map((value) => String(value / unit).replace(/^(-?)0\./, "$1."))
    .reduce((text, next) => (text === "" || next.startsWith("-") ? text + next : `${text} ${next}`), "");
}
