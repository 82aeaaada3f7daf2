import { type Marks, withMarks } from "#scripts/endgrain/marks.ts";
import { randomStream } from "#scripts/endgrain/random.ts";
import { type EndSpec, type RgbPicture, renderEnd, treeOf } from "#scripts/endgrain/render-end.ts";
import { trueRingDeg } from "#scripts/endgrain/ring-tree.ts";
import type { WoodKindName } from "#scripts/endgrain/wood-kinds.ts";

/** One generated end: how to draw it, and under what name to count it. */
export type GeneratedEnd = { name: string; group: string; spec: EndSpec; marks: Marks };

/** What is true of a generated end; angles in degrees, over ninths of the area, as in the photographs' truth. */
export type GeneratedTruth = {
  stations: number[];
  shares: { flat: number; rift: number; quartered: number };
  ringsPerInch: number;
};

/** Mean rings per inch that each kind is drawn with: usual figures for sawn stock, from memory of the trade, no table. */
const USUAL_RINGS_PER_INCH: Record<WoodKindName, [number, number]> = {
  softwood: [5, 14],
  oak: [7, 14],
  ash: [6, 12],
  maple: [10, 18],
  cherry: [8, 14],
  walnut: [5, 11],
};

/** The marks each test group carries, for a picture of the given height. */
const MARK_GROUPS: Record<string, (height: number, random: () => number) => Marks> = {
  clean: () => ({ noise: 3 }),
  saw: (height, random) => ({
    noise: 3,
    saw: { angleDeg: 90 * random() + 20, pitchPx: height * (0.06 + 0.08 * random()), depth: 16 },
  }),
  wax: (_height, random) => ({
    noise: 3,
    coat: { colour: [235, 232, 222], cover: 0.55, opacity: 0.6, brushDeg: 180 * random() },
  }),
  paint: (_height, random) => ({
    noise: 3,
    coat: { colour: [40, 90, 60], cover: 0.4, opacity: 1, brushDeg: 180 * random() },
  }),
  pencil: (height) => ({ noise: 3, strokes: { count: 4, widthPx: Math.max(1.5, height / 60), colour: [70, 70, 74] } }),
  crayon: (height) => ({ noise: 3, strokes: { count: 3, widthPx: height / 12, colour: [30, 70, 170] } }),
  shadow: (height, random) => ({
    noise: 4,
    shadow: { angleDeg: 40 + 100 * random(), at: 0.3 + 0.4 * random(), brightness: 0.35, softPx: height / 15 },
  }),
  blur: (height) => ({ noise: 3, blurPx: height / 90 }),
  checks: (height, random) => ({
    noise: 3,
    checks: { count: 5, from: { x: random() * 3 * height, y: 2 * height }, widthPx: height / 40 },
  }),
};

/** A set of ends drawn from a seed: every kind under every group of marks, `each` of them, piths all round. */
export function generatedSet(
  each: number,
  seed: number,
  kinds: readonly WoodKindName[] = ["softwood", "oak", "ash", "maple", "cherry", "walnut"],
): GeneratedEnd[] {
  const random = randomStream(seed);
  const ends: GeneratedEnd[] = [];
  for (const kind of kinds) {
    for (const [group, marksFor] of Object.entries(MARK_GROUPS)) {
      for (let i = 0; i < each; i++) {
        const widthMm = 90 + 130 * random();
        const thicknessMm = 22 + 22 * random();
        const distance = widthMm * (0.15 + 0.9 * random());
        const bearing = 2 * Math.PI * random();
        const [few, many] = USUAL_RINGS_PER_INCH[kind];
        const spec: EndSpec = {
          widthMm,
          thicknessMm,
          kind,
          pith: {
            xMm: widthMm / 2 + distance * Math.cos(bearing),
            yMm: thicknessMm / 2 + distance * Math.sin(bearing),
          },
          ringsPerInch: few + (many - few) * random(),
          seed: Math.floor(random() * 1e9),
          pxPerMm: 5 + 3 * random(),
        };
        ends.push({
          name: `${kind}-${group}-${i + 1}`,
          group,
          spec,
          marks: marksFor(thicknessMm * spec.pxPerMm, random),
        });
      }
    }
  }
  return ends;
}

/** Draws a generated end with its marks. */
export function drawGenerated(end: GeneratedEnd): RgbPicture {
  return withMarks(renderEnd(end.spec), end.marks, end.spec.seed);
}

/** The true angles and shares of a generated end, from its tree's geometry. */
export function generatedTruth(spec: EndSpec): GeneratedTruth {
  const tree = treeOf(spec);
  const shares = { flat: 0, rift: 0, quartered: 0 };
  const samples = 12;
  const stations = Array.from({ length: 9 }, (_, s) => {
    let sum = 0;
    for (let i = 0; i < samples; i++) {
      for (let j = 0; j < samples; j++) {
        const x = (spec.widthMm * (s + (i + 0.5) / samples)) / 9 - spec.pith.xMm;
        const y = (spec.thicknessMm * (j + 0.5)) / samples - spec.pith.yMm;
        const acute = Math.abs(trueRingDeg(tree, x, y));
        sum += acute;
        shares[acute < 30 ? "flat" : acute < 60 ? "rift" : "quartered"] += 1 / (9 * samples * samples);
      }
    }
    return sum / (samples * samples);
  });
  return { stations, shares, ringsPerInch: spec.ringsPerInch };
}
