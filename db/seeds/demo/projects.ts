import type { Knex } from "knex";
import { readBoardFilter } from "#app/domain/boards/board-filter.ts";
import { listSummaries } from "#app/domain/boards/boards.sql.server.ts";
import { placeHold, takeDown } from "#app/domain/holds/holds.server.ts";
import { insertPart, insertProject } from "#app/domain/projects/projects.sql.server.ts";
import type { DemoShop } from "./people.ts";

const inch = 25.4;
const dayMs = 86_400_000;

/** Two pieces under way: six stools and a bench for a hall, with their legs and rails, and boards spoken for. */
export async function addProjects(db: Knex, shop: DemoShop, now: Date): Promise<void> {
  const due = (days: number) => new Date(now.getTime() + days * dayMs).toISOString().slice(0, 10);
  const stools = await insertProject(db, shop.tomasz, {
    name: "Chapel stools",
    client: "St Anne's chapel",
    dueOn: due(54),
    crayon: "blue",
    state: "underway",
    notes: "Six stools, 25 in high. Legs splay, so the rings must run alike on both faces that show.",
  });
  const bench = await insertProject(db, shop.priya, {
    name: "Hall bench",
    client: "R. and M. Abara",
    dueOn: due(88),
    crayon: "red",
    state: "planned",
    notes: "Plank seat, four turned legs, one long stretcher.",
  });
  const part = (
    projectId: string,
    name: string,
    quantity: number,
    sizeIn: [number, number, number],
    species: string,
    rings: [number, number],
  ) =>
    insertPart(db, shop.tomasz, projectId, {
      name,
      quantity,
      thicknessMm: sizeIn[0] * inch,
      widthMm: sizeIn[1] * inch,
      lengthMm: sizeIn[2] * inch,
      species,
      ringMinDeg: rings[0],
      ringMaxDeg: rings[1],
    });
  await part(stools, "Leg", 24, [1.5, 1.5, 25.5], "white-oak", [30, 60]);
  await part(stools, "Seat", 6, [1.25, 13, 14], "white-oak", [0, 90]);
  await part(stools, "Rung", 24, [0.875, 0.875, 13], "white-oak", [30, 90]);
  await part(bench, "Leg", 4, [2.25, 2.25, 17], "black-walnut", [35, 55]);
  await part(bench, "Seat plank", 2, [1.5, 7.5, 62], "black-walnut", [0, 90]);
  await part(bench, "Stretcher", 1, [1.25, 2.5, 48], "black-walnut", [0, 90]);

  const rift = await some(db, shop, "species=white-oak&rings=rift&sort=tag");
  for (const [i, board] of rift.slice(0, 6).entries()) {
    const toMm = i % 2 === 0 ? board.lengthMm : Math.round(board.lengthMm / 2 / inch) * inch;
    await hold(db, shop, stools, board.id, { fromMm: 0, toMm }, i < 3 ? "legs" : "legs and rungs", now);
  }
  if (rift[0]) await takeDown(db, shop.tomasz, rift[0].id, now);
  const walnut = await some(db, shop, "species=black-walnut&sort=length");
  for (const board of walnut.slice(0, 3))
    await hold(db, shop, bench, board.id, { fromMm: 0, toMm: board.lengthMm }, "seat", now);
  const leg = walnut[3];
  if (leg) await hold(db, shop, bench, leg.id, { fromMm: leg.lengthMm - 20 * inch, toMm: leg.lengthMm }, "legs", now);
}

async function some(db: Knex, shop: DemoShop, query: string) {
  return listSummaries(db, shop.owner, readBoardFilter(new URLSearchParams(query), "in"), { limit: 8, offset: 0 });
}

async function hold(
  db: Knex,
  shop: DemoShop,
  projectId: string,
  boardId: string,
  stretch: { fromMm: number; toMm: number },
  note: string,
  now: Date,
): Promise<void> {
  const placed = await placeHold(
    db,
    shop.tomasz,
    { boardId, projectId, ...stretch, note, expiresAt: new Date(now.getTime() + 14 * dayMs) },
    now,
  );
  if (!placed.ok) throw new Error(`the demonstration's hold was refused: ${placed.why}`);
}
