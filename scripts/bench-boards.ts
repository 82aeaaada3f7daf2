import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import type { Knex } from "knex";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { listBoards } from "#app/domain/boards/boards.sql.server.ts";
import { ringColumns } from "#app/domain/rings/rings.server.ts";
import { createDb } from "#app/services/db.server.ts";
import { newId } from "#app/services/ids.server.ts";
import { anActor } from "#tests/factories/shop.ts";
import { migrate } from "./migrate.ts";
import { startPrivateMariadb } from "./private-mariadb.ts";
import { runScript } from "./run-script.ts";

const count = Number(process.argv[2] ?? 100_000);
const repeats = 9;

const queries = [
  "",
  "page=200",
  "species=white-oak&quarters=4",
  "species=white-oak&rings=rift&length=96&width=8",
  "rings=quartered&sort=angle",
  "sort=length&page=40",
  "moisture=8&sort=moisture",
  "figure=curl",
  "q=curl",
  "q=grey+streak",
  "q=WO-099",
  "q=31415",
  "free=yes&species=black-cherry",
  "state=any&sort=width",
];

const species = [
  "white-oak",
  "sugar-maple",
  "black-cherry",
  "black-walnut",
  "white-ash",
  "northern-red-oak",
  "yellow-birch",
  "yellow-poplar",
];
const prefixes = ["WO", "HM", "CH", "BW", "WA", "RO", "YB", "YP"];

/** Fills a shop with many boards and times the pages of its list: median and slowest of several runs each. */
await runScript(async () => {
  const folder = await mkdtemp(path.join(tmpdir(), "boards-"));
  const server = await startPrivateMariadb({ folder: path.join(folder, "db"), forgetful: true });
  const url = server.url("bench");
  await migrate(url);
  const db = createDb(url);
  try {
    const actor = await anActor(db, "maker");
    await fill(db, actor.shopId);
    for (const query of queries) {
      const filter = readBoardFilter(new URLSearchParams(query), "in");
      const times: number[] = [];
      let total = 0;
      for (let i = 0; i < repeats; i++) {
        const began = performance.now();
        total = (await listBoards(db, actor, filter)).total;
        times.push(performance.now() - began);
      }
      times.sort((a, b) => a - b);
      const [median, slowest] = [times[Math.floor(repeats / 2)] ?? 0, times.at(-1) ?? 0];
      console.log(
        `${(query || "(all)").padEnd(48)} ${String(total).padStart(7)} boards  median ${median.toFixed(0)} ms  slowest ${slowest.toFixed(0)} ms`,
      );
    }
  } finally {
    await db.destroy();
    await server.stop();
    await rm(folder, { recursive: true, force: true });
  }
});

async function fill(db: Knex, shopId: string): Promise<void> {
  const size = { widthMm: 200, thicknessMm: 25.4 };
  const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };
  const fields = [
    { xMm: 100, yMm: 140 },
    { xMm: -90, yMm: 190 },
    { xMm: -180, yMm: 12 },
  ].map((pith) => ringColumns(fieldFromPith(size, pith, 11), limits));
  const rows = Array.from({ length: count }, (_, i) => {
    const kind = i % species.length;
    const tag = `${prefixes[kind]}-${String(i + 1).padStart(4, "0")}`;
    const figure = i % 40 === 0 ? "curl" : "";
    return {
      id: newId(),
      shop_id: shopId,
      tag_number: i + 1,
      tag,
      species: species[kind],
      quarters: [4, 5, 6, 8][i % 4],
      thickness_mm: 25.4,
      length_mm: 1500 + ((i * 7919) % 2600),
      width_mm: 110 + ((i * 104729) % 190),
      moisture_pct: 6 + ((i * 31) % 80) / 10,
      state: i % 7 === 3 ? "used" : "racked",
      figure_kind: figure,
      search_text: `${tag} ${species[kind]} ${figure} ${i % 500 === 0 ? "grey streak near the far end" : ""}`,
      ...(i % 7 === 0 ? {} : fields[(i >> 3) % 3]),
    };
  });
  await db.batchInsert("boards", rows, 1000);
}
