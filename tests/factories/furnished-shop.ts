import type { Knex } from "knex";
import { fieldFromAngle } from "#app/core/rings/field-from-angle.ts";
import { correctBoard } from "#app/domain/boards/boards.server.ts";
import { beginDocument, confirmDocument } from "#app/domain/deliveries/documents.server.ts";
import { placeHold } from "#app/domain/holds/holds.server.ts";
import { keepMoistureReading } from "#app/domain/moisture/moisture.sql.server.ts";
import { invite } from "#app/domain/people/people.server.ts";
import { beginPhoto, confirmPhoto } from "#app/domain/photos/photos.server.ts";
import { keepReading } from "#app/domain/rings/rings.server.ts";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { Role } from "#app/domain/shop/permissions.ts";
import { newId } from "#app/services/ids.server.ts";
import type { Storage } from "#app/services/storage.server.ts";
import { aBoard, aProject } from "./board.ts";
import { aPicture } from "./pictures.ts";
import { anActor } from "./shop.ts";
import { sendTo } from "./storage.ts";

/** What wood cost in a furnished shop, in minor units: figures that stand nowhere else, so that a page that lets one out is found. */
export const secretMoney = [7_654_321, 8_765_432, 9_876_543];
const [boardCost, priceOfDelivery, freight] = secretMoney as [number, number, number];

/** A shop with one of each record, and somebody of each role. */
export interface FurnishedShop extends Record<RecordName, string> {
  people: Record<Role, Actor>;
}

type RecordName =
  | "shopId"
  | "armId"
  | "supplierId"
  | "deliveryId"
  | "talliedId"
  | "documentId"
  | "waitingDocumentId"
  | "boardId"
  | "spareBoardId"
  | "benchBoardId"
  | "photoId"
  | "waitingPhotoId"
  | "defectId"
  | "projectId"
  | "partId"
  | "holdId"
  | "invitationId"
  | "colleagueId";

/** Furnishes one, through the use cases where there are some. The hold is the maker's. */
export async function aFurnishedShop(db: Knex, storage: Storage): Promise<FurnishedShop> {
  const owner = await anActor(db, "owner");
  const { shopId } = owner;
  const [maker, helper, colleague] = [
    await anActor(db, "maker", { shopId }),
    await anActor(db, "helper", { shopId }),
    await anActor(db, "helper", { shopId }),
  ];
  await db("shops").where({ id: shopId }).update({ tag_next: 50_000 });
  const now = new Date();
  const [bayId, armId, supplierId, deliveryId, talliedId, defectId, partId] = Array.from({ length: 7 }, newId) as [
    string,
    string,
    string,
    string,
    string,
    string,
    string,
  ];
  await db("bays").insert({ id: bayId, shop_id: shopId, name: "A" });
  await db("arms").insert({ id: armId, shop_id: shopId, bay_id: bayId, level: 1 });
  await db("suppliers").insert({ id: supplierId, shop_id: shopId, name: "Upland Hardwoods" });
  const delivery = {
    shop_id: shopId,
    supplier_id: supplierId,
    received_on: "2027-02-01",
    species: "white-oak",
    quarters: 4,
    price_minor: priceOfDelivery,
    price_basis: "lump",
    freight_minor: freight,
    created_by: owner.personId,
  };
  await db("deliveries").insert([
    { id: deliveryId, ...delivery, tallied_at: null },
    { id: talliedId, ...delivery, tallied_at: now },
  ]);
  const board = await aBoard(db, owner, {
    cost_minor: boardCost - 1,
    delivery_id: talliedId,
    arm_id: armId,
    notes: "clear",
  });
  await correctBoard(db, owner, board.id, 1, { costMinor: boardCost });
  const spare = await aBoard(db, owner, { cost_minor: boardCost });
  const onBench = await aBoard(db, owner, { state: "out" });
  await db("board_defects").insert({
    id: defectId,
    shop_id: shopId,
    board_id: board.id,
    kind: "knot",
    along_mm: 100,
    across_mm: 10,
    length_mm: 20,
    width_mm: 20,
  });
  const project = await aProject(db, owner);
  await db("parts").insert({
    id: partId,
    shop_id: shopId,
    project_id: project.id,
    name: "Leg",
    quantity: 4,
    thickness_mm: 45,
    width_mm: 45,
    length_mm: 450,
    species: "white-oak",
  });
  const held = await placeHold(
    db,
    maker,
    {
      boardId: board.id,
      projectId: project.id,
      fromMm: 0,
      toMm: 600,
      note: "",
      expiresAt: new Date(now.getTime() + 86_400_000),
    },
    now,
  );
  if (!held.ok) throw new Error("not held");
  const reading = { meterPct: 9, moisturePct: 9, meter: "pin", woodTemperatureC: null, place: "" } as const;
  await keepMoistureReading(db, helper, board.id, reading, now);
  const field = fieldFromAngle({ widthMm: 203.2, thicknessMm: 25.4 }, 40, "left");
  const limits = { flatBelowDeg: 30, quarteredAboveDeg: 60 };
  const byEye = {
    boardEnd: "near",
    source: "angle",
    methodVersion: "test",
    photoId: null,
    inputs: {},
    confidence: 0.5,
  };
  await keepReading(db, maker, board.id, { ...byEye, boardEnd: "near", source: "angle", field }, limits, now);
  const picture = await aPicture({ widthPx: 320, heightPx: 80 });
  const aPhoto = async () => {
    const photo = { boardId: board.id, kind: "near end", bytes: picture.length, contentType: "image/jpeg" } as const;
    const begun = await beginPhoto(db, storage, maker, photo, now);
    if (!begun) throw new Error("not begun");
    await sendTo(begun.put, picture);
    return begun.id;
  };
  const photoId = await aPhoto();
  await confirmPhoto(db, storage, maker, photoId);
  const aDocument = async () => {
    const paper = { deliveryId, name: "invoice.jpg", bytes: picture.length, contentType: "image/jpeg" };
    const begun = await beginDocument(db, storage, maker, paper, now);
    if (!begun) throw new Error("not begun");
    await sendTo(begun.put, picture);
    return begun.id;
  };
  const documentId = await aDocument();
  await confirmDocument(db, storage, maker, documentId);
  const invited = `guest-of-${shopId}@shop.example`;
  await invite(db, owner, invited, "helper", now);
  const invitation = await db("invitations").where({ shop_id: shopId, email: invited }).first("id");
  return {
    people: { owner, maker, helper },
    shopId,
    armId,
    supplierId,
    deliveryId,
    talliedId,
    documentId,
    waitingDocumentId: await aDocument(),
    boardId: board.id,
    spareBoardId: spare.id,
    benchBoardId: onBench.id,
    photoId,
    waitingPhotoId: await aPhoto(),
    defectId,
    projectId: project.id,
    partId,
    holdId: held.holdId,
    invitationId: invitation.id,
    colleagueId: colleague.personId,
  };
}
