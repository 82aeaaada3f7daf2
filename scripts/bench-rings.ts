import { readEnd } from "#app/core/endgrain/read-end.ts";
import { developmentEnds } from "#scripts/endgrain/development-set.ts";
import { generatedSet } from "#scripts/endgrain/generated-set.ts";
import { NOT_ENDS, renderNotEnd } from "#scripts/endgrain/not-ends.ts";
import { quantile, SCORE_HEADER, type ScoredEnd, scoreLine } from "#scripts/endgrain/score.ts";
import { type BothMethods, scoreDevelopment, scoreGenerated } from "#scripts/endgrain/score-sets.ts";

/** Prints how well the rings are read, on the development photographs and on generated ends, beside the plain structure tensor. */
async function main(): Promise<void> {
  const development: BothMethods[] = [];
  for (const end of developmentEnds()) development.push(await scoreDevelopment(end));
  const generated = generatedSet(EACH, SEED).map(scoreGenerated);
  console.log(
    "Errors in degrees over all stations; class with near ties (under 0.1) left out; wrong = sure but class wrong or middle error over 5°;",
  );
  console.log(
    "pith (where inside) as a part of the width; rings per inch as a part of the truth. Photographs' ms include decoding.\n",
  );
  if (development.length === 0) console.log("The development photographs are not here: 0 of 60 read.");
  else printSet("Photographs", development);
  printSet(`Generated (seed ${SEED})`, generated);
  const readings = [...development, ...generated].flatMap((both) => both.reading ?? []);
  printCalibration(readings);
  printNotEnds();
}

const EACH = 3;
const SEED = 7;

function printSet(title: string, set: BothMethods[]): void {
  const readings = set.flatMap((both) => both.reading ?? []);
  console.log(`${title}: ${set.length} ends, ${set.length - readings.length} refused\n${SCORE_HEADER}`);
  console.log(scoreLine("read", readings));
  console.log(
    scoreLine(
      "plain structure tensor",
      set.map((both) => both.plain),
    ),
  );
  const kindOf = (end: ScoredEnd) => end.name.split(/[-.]/)[0]!;
  for (const [by, pick] of [
    ["kind", kindOf],
    ["group", (end: ScoredEnd) => end.group],
  ] as const) {
    for (const name of [...new Set(readings.map(pick))].sort()) {
      console.log(
        scoreLine(
          `  ${by} ${name}`,
          readings.filter((end) => pick(end) === name),
        ),
      );
    }
  }
  console.log("");
}

/** Station error against station confidence: what a confidence is worth. */
function printCalibration(readings: ScoredEnd[]): void {
  console.log("Station confidence against error, both sets\n  confidence    stations  median   90th  within 5°");
  const edges = [0, 0.2, 0.4, 0.6, 0.7, 0.8, 0.9, 0.95, 1.001];
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!];
    const errors = readings.flatMap((end) =>
      end.errors.filter((_, s) => end.stationConfidences[s]! >= from && end.stationConfidences[s]! < to),
    );
    if (errors.length === 0) continue;
    const within = (100 * errors.filter((error) => error < 5).length) / errors.length;
    const cells = [
      String(errors.length).padStart(8),
      quantile(errors, 0.5)!.toFixed(2).padStart(7),
      quantile(errors, 0.9)!.toFixed(2).padStart(6),
      `${within.toFixed(1)}%`.padStart(9),
    ];
    console.log(`  ${from.toFixed(2)} to ${Math.min(1, to).toFixed(2)} ${cells.join(" ")}`);
  }
  console.log("");
}

/** Pictures that are no end: none may come out sure. */
function printNotEnds(): void {
  console.log("Pictures that are no single end (4 each): refused / unsure / sure");
  for (const name of NOT_ENDS) {
    const answers = [1, 2, 3, 4].map((seed) => readEnd(renderNotEnd(name, seed)));
    const refused = answers.filter((answer) => !answer.ok).length;
    const sure = answers.filter((answer) => answer.ok && answer.sure).length;
    console.log(`  ${name.padEnd(12)} ${refused} / ${4 - refused - sure} / ${sure}`);
  }
}

await main();
