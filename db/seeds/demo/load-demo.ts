import type { Knex } from "knex";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { boardMeasure } from "#app/domain/boards/board-measure.ts";
import { moveBoard } from "#app/domain/boards/boards.server.ts";
import { insertDelivery } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { supplierNamed } from "#app/domain/deliveries/suppliers.sql.server.ts";
import { saveTally } from "#app/domain/deliveries/tally.server.ts";
import { keepMoistureReading } from "#app/domain/moisture/moisture.sql.server.ts";
import { addBay, listBays } from "#app/domain/rack/rack.sql.server.ts";
import { keepReading } from "#app/domain/rings/rings.server.ts";
import { getShop } from "#app/domain/shop/shops.sql.server.ts";
import type { Storage } from "#app/services/storage.server.ts";
import { normal, randomStream } from "#scripts/endgrain/random.ts";
import { type DemoShop, openDemoShop } from "./people.ts";
import { addEndPicture, addFacePicture, type DrawnBoard } from "./pictures.ts";
import { addProjects } from "./projects.ts";
import { bays, type DemoDelivery, deliveries } from "./stock.ts";

const inch = 25.4;
const dayMs = 86_400_000;
const thicknessMm = (quarters: number) => (quarters / 4) * inch;

/** Every third board's end has a picture, every seventh its face too; the same boards each time. */
const endEvery = 3;
const faceEvery = 7;

/**
 * Loads the demonstration: an invented workshop, its people, about two hundred boards of eight species and more, readings over months, pictures drawn
 * by a program and marked so, holds for two projects. It goes through the same use cases as a person would, and is the same each time but for the
 * date, from which all its days are counted.
 */
export async function loadDemo(db: Knex, storage: Storage, now: Date = new Date()): Promise<void> {
  const shop = await openDemoShop(db, now);
  for (const bay of bays) await addBay(db, shop.owner, { ...bay, armWidthMm: 26 * inch });
  const arms = await armsByName(db, shop);
  for (const [index, delivery] of deliveries.entries()) await receive(db, storage, shop, arms, delivery, index, now);
  await addProjects(db, shop, now);
}

async function armsByName(db: Knex, shop: DemoShop): Promise<Map<string, string>> {
  const all = await listBays(db, shop.owner);
  return new Map(all.flatMap((bay) => bay.arms.map((arm) => [`${bay.name}${arm.level}`, arm.id] as const)));
}

async function receive(
  db: Knex,
  storage: Storage,
  shop: DemoShop,
  arms: ReadonlyMap<string, string>,
  delivery: DemoDelivery,
  index: number,
  now: Date,
): Promise<void> {
  const random = randomStream(9_000 + index);
  const day = new Date(now.getTime() - delivery.daysAgo * dayMs);
  const sizes = Array.from({ length: delivery.count }, () => ({
    widthMm: Math.round(Math.max(4.5, delivery.widthIn + 1.3 * normal(random)) * 8) * (inch / 8),
    lengthMm: Math.round(Math.max(60, delivery.lengthIn + 9 * normal(random)) * 2) * (inch / 2),
  }));
  const measured = sizes.reduce(
    (sum, size) => sum + boardMeasure({ ...size, widthFarMm: null, quarters: delivery.quarters }),
    0,
  );
  const deliveryId = await insertDelivery(
    db,
    shop.tomasz,
    {
      supplierId: "",
      newSupplier: "",
      receivedOn: day.toISOString().slice(0, 10),
      reference: delivery.reference,
      species: delivery.species,
      quarters: delivery.quarters,
      drying: delivery.drying,
      grade: delivery.grade,
      claimedVolume: Math.round(measured * delivery.claimedOver),
      claimedUnit: "bf",
      priceMinor: delivery.pricePerBfMinor,
      priceBasis: "bf",
      freightMinor: 8500,
      origin: delivery.origin,
      certificate: "",
      notes: "",
    },
    await supplierNamed(db, shop.tomasz, delivery.supplier),
  );
  const lines = sizes.map((size) => ({ count: 1, ...size, species: delivery.species, quarters: delivery.quarters }));
  const saved = await saveTally(db, shop.tomasz, deliveryId, lines, day);
  if (!saved.ok) throw new Error(`the demonstration's tally was refused: ${saved.why}`);
  const settings = await getShop(db, shop.shopId);
  for (const [i, boardId] of saved.boardIds.entries()) {
    const size = sizes[i];
    if (!size || !settings) continue;
    const board: DrawnBoard = {
      id: boardId,
      ...size,
      thicknessMm: thicknessMm(delivery.quarters),
      pith: pithOf(delivery, size.widthMm, thicknessMm(delivery.quarters), i, random),
      ringsPerInch: delivery.ringsPerInch * (0.85 + 0.3 * random()),
      kind: delivery.kind,
      seed: index * 1000 + i,
    };
    const [bay, level] = delivery.arms[Math.floor((i * delivery.arms.length) / delivery.count)] as [string, number];
    await moveBoard(db, shop.joel, boardId, arms.get(`${bay}${level}`) ?? null);
    if (i % endEvery === 0) await pictureAndRead(db, storage, shop, board, settings.classLimits, i, day);
    else if (i % 5 !== 1) await readByEye(db, shop, board, settings.classLimits, day);
    await meter(db, shop, delivery, boardId, now, random, i);
    await describe(db, shop, delivery, boardId, i);
  }
}

/** Where the tree's centre lay when the board was sawn: under it for a flat board, beside it for a quartered one, between for rift. */
function pithOf(
  delivery: DemoDelivery,
  widthMm: number,
  thickMm: number,
  i: number,
  random: () => number,
): { xMm: number; yMm: number } {
  const way = ((i * 37) % 100) / 100;
  const far = 70 + 90 * random();
  if (way < delivery.sawn.flat) return { xMm: widthMm * (0.35 + 0.3 * random()), yMm: thickMm + far };
  const side = random() < 0.5 ? -1 : 1;
  const x = (reach: number) => (side < 0 ? -reach : widthMm + reach);
  if (way < delivery.sawn.flat + delivery.sawn.rift)
    return { xMm: x(far * 0.9), yMm: thickMm + far * 1.25 + widthMm * 0.55 };
  return { xMm: x(far * 1.2), yMm: thickMm * (0.2 + 0.6 * random()) };
}

type Limits = { flatBelowDeg: number; quarteredAboveDeg: number };

async function pictureAndRead(
  db: Knex,
  storage: Storage,
  shop: DemoShop,
  board: DrawnBoard,
  limits: Limits,
  i: number,
  at: Date,
): Promise<void> {
  const photo = await addEndPicture(db, storage, shop.joel, board, at);
  if (i % faceEvery === 0) await addFacePicture(db, storage, shop.joel, board, at);
  const inputs = { photo: { widthPx: photo.widthPx, heightPx: photo.heightPx } };
  await keepReading(
    db,
    shop.priya,
    board.id,
    { ...readingOf(board), source: "strokes", methodVersion: "demo", photoId: photo.id, inputs },
    limits,
    at,
  );
}

async function readByEye(db: Knex, shop: DemoShop, board: DrawnBoard, limits: Limits, at: Date): Promise<void> {
  await keepReading(
    db,
    shop.tomasz,
    board.id,
    { ...readingOf(board), source: "angle", methodVersion: "demo", photoId: null, inputs: {} },
    limits,
    at,
  );
}

function readingOf(board: DrawnBoard) {
  return { boardEnd: "near" as const, field: fieldFromPith(board, board.pith, board.ringsPerInch), confidence: 0.9 };
}

/** Readings every few weeks from the day it came, drying toward the shop's 7.7 %, a little off each time as meters are. */
async function meter(
  db: Knex,
  shop: DemoShop,
  delivery: DemoDelivery,
  boardId: string,
  now: Date,
  random: () => number,
  i: number,
): Promise<void> {
  if (i % 4 === 3) return;
  const begins = delivery.drying === "air" ? 12.5 + random() : 8.2 + random() * 0.8;
  const step = i % 8 === 0 ? 21 : 55;
  for (let daysAgo = delivery.daysAgo; daysAgo >= 1; daysAgo -= step) {
    const days = delivery.daysAgo - daysAgo;
    const pct = 7.7 + (begins - 7.7) * Math.exp(-days / (18 * delivery.quarters)) + 0.15 * normal(random);
    const moisturePct = Math.round(pct * 10) / 10;
    const reading = {
      meterPct: moisturePct,
      moisturePct,
      meter: "pin" as const,
      woodTemperatureC: 20,
      place: i % 2 ? "middle, heart face" : "",
    };
    await keepMoistureReading(db, shop.joel, boardId, reading, new Date(now.getTime() - daysAgo * dayMs));
  }
}

const figures: Record<string, [string, number, string][]> = {
  "white-oak": [["ray fleck", 2, "both faces"]],
  "sugar-maple": [
    ["curl", 2, "far half"],
    ["bird's eye", 1, "bark face"],
  ],
  "black-walnut": [["crotch", 2, "far end"]],
  "black-cherry": [["curl", 1, "near end"]],
  "white-ash": [["cathedral", 1, "heart face"]],
};

/** A few boards have something to say for themselves: figure, sapwood, a log they share. */
async function describe(db: Knex, shop: DemoShop, delivery: DemoDelivery, boardId: string, i: number): Promise<void> {
  const kinds = figures[delivery.species];
  const figure = kinds && i % 6 === 2 ? kinds[i % kinds.length] : undefined;
  const change = {
    ...(figure ? { figure_kind: figure[0], figure_strength: figure[1], figure_where: figure[2] } : {}),
    ...(delivery.reference.startsWith("HH")
      ? { log_name: `${delivery.reference}-${1 + Math.floor(i / 6)}`, log_sequence: 1 + (i % 6) }
      : {}),
    ...(i % 9 === 4 ? { sap_share_pct: 10 + (i % 4) * 5 } : {}),
    ...(i % 11 === 5 ? { colour_note: "a grey streak near the far end" } : {}),
  };
  if (Object.keys(change).length > 0) await db("boards").where({ id: boardId, shop_id: shop.shopId }).update(change);
}
