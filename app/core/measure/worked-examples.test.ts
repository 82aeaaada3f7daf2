import { existsSync, readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { kilnDriedMinimumMm, kilnDriedMinimumWidthMm } from "#app/core/lengths/kiln-dried-minimum.ts";
import { parseLength } from "#app/core/lengths/parse-length.ts";
import { nominalThicknessMm, surfacedThicknessMm } from "#app/core/lengths/quarters.ts";
import { bundleTally } from "./bundle-tally.ts";
import { netFromGross } from "./kiln-allowance.ts";
import { tallyWidthMm } from "./measured-board.ts";
import { publishedRows, type WorkedRow } from "./published-rows.fixture.ts";
import { wholeFeet } from "./surface-measure.ts";
import { tally } from "./tally.ts";
import { trueBoardFeet, volumeM3 } from "./true-volume.ts";
import { boardFeetPerFt3, convertVolume } from "./volume-units.ts";
import { grossForYield, yieldPct } from "./yield.ts";

/** The sizes in a row, read by the program's own reader. */
function mm(text: string): number {
  const parsed = parseLength(text.trim(), "in");
  if (!parsed.ok) throw new Error(`${text}: ${parsed.why}`);
  return parsed.mm;
}

const board = (width: string, length: string, quarters = 4) => ({ widthMm: mm(width), lengthMm: mm(length), quarters });
const surfaceAndFeet = (measured: ReturnType<typeof tally>) => ({
  sm: measured.surfaceMeasureFt2,
  bf: measured.boardFeet,
});
const inches = (value: number) => value / 25.4;

const computed: Array<[pattern: RegExp, compute: (match: string[]) => unknown]> = [
  [
    /^rough board: thickness 2 in, width (.+ in), length (.+ ft); surface measure$/,
    (m) => tally([board(m[1]!, m[2]!, 8)]).surfaceMeasureFt2,
  ],
  [
    /^same board \(2 in x (.+ in) x (.+ ft)\): board feet by surface measure$/,
    (m) => tally([board(m[1]!, m[2]!, 8)]).boardFeet,
  ],
  [/^width (.+ in), length (.+ ft): SM/, (m) => tally([board(m[1]!, m[2]!)]).surfaceMeasureFt2],
  [
    /^export bundle .* board (.+ in) wide, (.+ ft) long$/,
    (m) => ({ widthIn: bundleTally([board(m[1]!, m[2]!)]).widthIn, lengthFt: wholeFeet(mm(m[2]!)) }),
  ],
  [
    /^(\d+)\/4 board, (.+ in) x (.+): length drops to .*; bf$/,
    (m) => ({
      lengthFt: wholeFeet(mm(m[3]!)),
      ...surfaceAndFeet(tally([board(m[2]!, m[3]!, Number(m[1]))])),
    }),
  ],
  [
    /^(\d+)\/4 board, (.+ in) x (.+): length drops to .* rounds to 9$/,
    (m) => ({
      lengthFt: wholeFeet(mm(m[3]!)),
      ...surfaceAndFeet(tally([board(m[2]!, m[3]!, Number(m[1]))])),
    }),
  ],
  [/^(\d+)\/4 board, (.+ in) x (.+ ft): SM/, (m) => surfaceAndFeet(tally([board(m[2]!, m[3]!, Number(m[1]))]))],
  [
    /^two 4\/4 boards each (.+ in) x (.+ ft) \(4\.5 each\)/,
    (m) => tally([{ ...board(m[1]!, m[2]!), count: 2 }]).boardFeet,
  ],
  [/^3\/4 in rough board, (.+ in) x (.+ ft): board feet/, (m) => tally([board(m[1]!, m[2]!, 3)]).boardFeet],
  [/^exact volume of 2 in x (.+ in) x (.+ in), no rounding$/, (m) => trueBoardFeet(board(m[1]!, m[2]!, 8))],
  [/^1 m3 in board feet$/, () => convertVolume(1, "m3", "bf")],
  [/^1 bf in m3$/, () => convertVolume(1, "bf", "m3")],
  [/^1 ft3 in board feet$/, () => boardFeetPerFt3],
  [
    /^(.+ mm) x (.+ mm) x (.+ m) square-edged board$/,
    (m) => volumeM3({ quarters: 4, thicknessMm: mm(m[1]!), widthMm: mm(m[2]!), lengthMm: mm(m[3]!) }),
  ],
  [
    /^tapered 4\/4 board (.+ ft) long, (.+ in) at the wide end, (.+ in) at the narrow end/,
    (m) => {
      const tapered = { ...board(m[2]!, m[1]!), widthFarMm: mm(m[3]!) };
      return { widthIn: inches(tallyWidthMm(tapered)), sm: tally([tapered]).surfaceMeasureFt2 };
    },
  ],
  [
    /^green \(gross\) tally (\d+) bf, (\d+) % loss in kiln: net tally$/,
    (m) => netFromGross(Number(m[1]), Number(m[2])),
  ],
  [
    /^(\d+)\/4 rough, kiln dried: thinnest allowed/,
    (m) => inches(kilnDriedMinimumMm(nominalThicknessMm(Number(m[1])))!),
  ],
  [
    /^minimum width of a (.+ in) FAS board after kiln drying/,
    (m) => inches(kilnDriedMinimumWidthMm(mm(m[1]!)).mostPiecesMm),
  ],
  [/^NHLA standard surfaced \(S2S\) thickness of (\d+)\/4$/, (m) => inches(surfacedThicknessMm(Number(m[1]))!)],
  [/^parts net ([\d.]+) bf from ([\d.]+) bf of rough boards: yield$/, (m) => yieldPct(Number(m[1]), Number(m[2]))],
  [/^([\d.]+) bf needed net at (\d+) % yield: rough to buy$/, (m) => grossForYield(Number(m[1]), Number(m[2]))],
];

function check({ input, expected, tolerance }: WorkedRow) {
  const found = computed.map(([pattern, compute]) => ({ match: input.match(pattern), compute })).find((c) => c.match);
  expect(found, "no check is written for this row").toBeDefined();
  const result = found!.compute(found!.match!);
  const wanted = typeof expected === "number" ? { value: expected } : (expected as Record<string, number>);
  const got = typeof result === "number" ? { value: result } : (result as Record<string, number>);
  for (const [name, value] of Object.entries(wanted))
    expect(Math.abs(got[name]! - value), name).toBeLessThanOrEqual(tolerance + 1e-9);
}

const topics = ["volume", "thickness", "yield"];

describe("published values of measure and thickness", () => {
  it.each(publishedRows)("$topic: $input ($confidence; $source)", check);
});

const reference = "../shared/reference/worked-examples.json";

describe.skipIf(!existsSync(reference))("worked examples of the trade reference: volume, thickness, yield", () => {
  const all: WorkedRow[] = existsSync(reference) ? JSON.parse(readFileSync(reference, "utf8")) : [];
  const rows = all.filter(({ topic }) => topics.includes(topic));

  it("are no fewer than those copied here", () => {
    expect(rows.length).toBeGreaterThanOrEqual(publishedRows.length);
  });

  it.each(rows)("$topic: $input ($confidence)", check);
});
