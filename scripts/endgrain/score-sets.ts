import { luminance } from "#app/core/endgrain/contrast.ts";
import type { EndPixels } from "#app/core/endgrain/pixels.ts";
import { readEnd } from "#app/core/endgrain/read-end.ts";
import type { ClassShares, RingClass } from "#app/core/rings/ring-types.ts";
import { decodePhoto } from "#app/services/decode-photo.server.ts";
import { DEVELOPMENT_FOLDER, type DevelopmentEnd } from "#scripts/endgrain/development-set.ts";
import { drawGenerated, type GeneratedEnd, generatedTruth } from "#scripts/endgrain/generated-set.ts";
import { plainStationAngles, plainTensor } from "#scripts/endgrain/plain-tensor.ts";
import { largestClass, type ScoredEnd } from "#scripts/endgrain/score.ts";

type Truth = { angles: number[]; shares: ClassShares; class: RingClass };
type Named = { name: string; group: string };

/** The reading and the plain tensor (sigma 1.5, summed over the station) of one end, each beside the truth. */
export type BothMethods = { reading: ScoredEnd | null; plain: ScoredEnd };

/** Reads one development photograph; the time includes decoding. */
export async function scoreDevelopment(end: DevelopmentEnd): Promise<BothMethods> {
  const started = performance.now();
  const { pixels } = await decodePhoto(`${DEVELOPMENT_FOLDER}/${end.file}`);
  const mm = end.pixelsPerMm ? { widthMm: end.width / end.pixelsPerMm, thicknessMm: end.height / end.pixelsPerMm } : {};
  const truth: Truth = { angles: end.stations.map((s) => s.angle), shares: end.share, class: end.dominant };
  const pithInside = end.pith?.inside ? { x: end.pith.x / end.width, y: end.pith.y / end.width } : null;
  return score(
    pixels,
    { name: end.file, group: end.source },
    truth,
    { mm, pith: pithInside, ringsPerInch: end.ringsPerInch ?? null },
    started,
  );
}

/** Draws and reads one generated end; the time is the reading's alone. */
export function scoreGenerated(end: GeneratedEnd): BothMethods {
  const pixels = drawGenerated(end);
  const true_ = generatedTruth(end.spec);
  const { widthMm, thicknessMm, pith } = end.spec;
  const inside = pith.xMm > 0 && pith.xMm < widthMm && pith.yMm > 0 && pith.yMm < thicknessMm;
  const truth: Truth = { angles: true_.stations, shares: true_.shares, class: largestClass(true_.shares) };
  const known = {
    mm: { widthMm, thicknessMm },
    pith: inside ? { x: pith.xMm / widthMm, y: pith.yMm / widthMm } : null,
    ringsPerInch: true_.ringsPerInch,
  };
  return score(pixels, { name: end.name, group: end.group }, truth, known, performance.now());
}

function score(
  pixels: EndPixels,
  named: Named,
  truth: Truth,
  known: {
    mm: { widthMm?: number; thicknessMm?: number };
    pith: { x: number; y: number } | null;
    ringsPerInch: number | null;
  },
  started: number,
): BothMethods {
  const reading = readEnd(pixels, known.mm);
  const ms = performance.now() - started;
  const base = { ...named, trueShares: truth.shares, trueClass: truth.class };
  const errorsOf = (angles: number[]) => angles.map((angle, i) => Math.abs(angle - truth.angles[i]!));
  const plainAngles = plainStationAngles(plainTensor(luminance(pixels), 1.5), 9);
  const plainShares = sharesOf(plainAngles);
  const plain: ScoredEnd = {
    ...base,
    errors: errorsOf(plainAngles),
    stationConfidences: [],
    shares: plainShares,
    class: largestClass(plainShares),
    sure: false,
    confidence: 0,
    pithError: null,
    ringsError: null,
    ms: 0,
  };
  if (!reading.ok) return { reading: null, plain };
  const { pith, ringsPerInch, widthMm } = reading;
  return {
    plain,
    reading: {
      ...base,
      errors: errorsOf(reading.stations.map((s) => s.angleDeg)),
      stationConfidences: reading.stations.map((s) => s.confidence),
      shares: reading.shares,
      class: reading.class,
      sure: reading.sure,
      confidence: reading.confidence,
      pithError:
        pith && known.pith ? Math.hypot(pith.xMm / widthMm - known.pith.x, pith.yMm / widthMm - known.pith.y) : null,
      ringsError: ringsPerInch && known.ringsPerInch ? Math.abs(ringsPerInch / known.ringsPerInch - 1) : null,
      ms,
    },
  };
}

function sharesOf(angles: number[]): ClassShares {
  const shares: ClassShares = { flat: 0, rift: 0, quartered: 0 };
  for (const angle of angles) shares[angle < 30 ? "flat" : angle < 60 ? "rift" : "quartered"] += 1 / angles.length;
  return shares;
}
