import { calculators } from "#app/domain/calculators/calculators.ts";
import type { Permission } from "#app/domain/shop/permissions.ts";
import type { FurnishedShop } from "./furnished-shop.ts";

type Sent = Record<string, string> | { json: unknown };

/** How one route is asked, and who may. */
export interface AskedRoute {
  /** Its address, with a shop's records in it. */
  at: (shop: FurnishedShop) => string;
  get?: Permission;
  post?: Permission;
  /** What is posted: a form, or JSON. What it names is of the first shop, the address may be of another. */
  form?: (shop: FurnishedShop) => Sent;
}

const soon = () => new Date(Date.now() + 7 * 86_400_000).toISOString().slice(0, 10);

const project = { name: "Trestle table", client: "", dueOn: "", crayon: "green", state: "planned", notes: "" };
const supplier = { name: "Valley Sawmill", email: "", phone: "", notes: "", version: "1" };
const tallyRow = { count: "1", width: "8", length: "96", quarters: "4", species: "white-oak" };
const delivery = (shop: FurnishedShop) => ({
  supplierId: shop.supplierId,
  receivedOn: "2027-02-03",
  species: "white-oak",
  quarters: "4",
  version: "1",
});
const corners = [
  { x: 10, y: 10 },
  { x: 310, y: 10 },
  { x: 310, y: 60 },
  { x: 10, y: 60 },
];
const ring = [
  { x: 60, y: 50 },
  { x: 160, y: 30 },
  { x: 260, y: 50 },
];
const marks = { corners, strokes: [ring, ring.map(({ x, y }) => ({ x, y: y - 12 }))], pith: null };
const upload = { bytes: 1000, contentType: "image/jpeg" };

/** Every route of a shop that has a loader or an action, by its file. The rules are those of app/domain/shop/permissions.ts. */
export const asked: Record<string, AskedRoute> = {
  "routes/rack/rack.tsx": { at: () => "/rack", get: "board:see" },
  "routes/rack/new-bay.tsx": {
    at: () => "/rack/bays/new",
    get: "rack:change",
    post: "rack:change",
    form: () => ({ name: "Z", arms: "2", armWidthMm: "24" }),
  },
  "routes/boards/list.tsx": { at: () => "/boards?state=any", get: "board:see" },
  "routes/boards/board.tsx": { at: (shop) => `/boards/${shop.boardId}`, get: "board:see" },
  "routes/boards/correct.tsx": {
    at: (shop) => `/boards/${shop.spareBoardId}/correct/notes`,
    get: "board:correct",
    post: "board:correct",
    form: () => ({ version: "1", notes: "wind at one end" }),
  },
  "routes/boards/moisture.tsx": {
    at: (shop) => `/boards/${shop.boardId}/moisture`,
    get: "moisture:read",
    post: "moisture:read",
    form: () => ({ meterPct: "9", meter: "pinless" }),
  },
  "routes/boards/move.tsx": {
    at: (shop) => `/boards/${shop.boardId}/move`,
    get: "board:move",
    post: "board:move",
    form: (shop) => ({ armId: shop.armId }),
  },
  "routes/boards/mark.tsx": {
    at: (shop) => `/boards/${shop.spareBoardId}/mark`,
    get: "board:correct",
    post: "board:correct",
    form: () => ({ to: "lost" }),
  },
  "routes/boards/offcut.tsx": {
    at: (shop) => `/boards/${shop.benchBoardId}/offcut`,
    get: "board:correct",
    post: "board:correct",
    form: () => ({ alongMm: "0", acrossMm: "0", lengthMm: "20", widthMm: "4" }),
  },
  "routes/boards/defects.tsx": {
    at: (shop) => `/boards/${shop.boardId}/defects`,
    get: "board:correct",
    post: "board:correct",
    form: () => ({ kind: "knot", face: "both", alongMm: "10", acrossMm: "1", lengthMm: "1", widthMm: "1" }),
  },
  "routes/boards/reserve.tsx": {
    at: (shop) => `/boards/${shop.boardId}/reserve`,
    get: "hold:place",
    post: "hold:place",
    form: (shop) => ({ projectId: shop.projectId, part: "far", lengthMm: "10", until: soon() }),
  },
  "routes/boards/state.ts": {
    at: (shop) => `/boards/${shop.boardId}/state`,
    post: "board:take-down",
    form: () => ({ intent: "take down" }),
  },
  "routes/boards/delete.tsx": {
    at: (shop) => `/boards/${shop.spareBoardId}/delete`,
    get: "board:delete",
    post: "board:delete",
  },
  "routes/boards/remove-photo.ts": {
    at: (shop) => `/boards/${shop.boardId}/photos/${shop.photoId}/remove`,
    post: "photo:remove",
  },
  "routes/rings/by-eye.tsx": {
    at: (shop) => `/boards/${shop.boardId}/rings/by-eye`,
    get: "rings:read",
    post: "rings:read",
    form: () => ({ boardEnd: "far", angleDeg: "40", falls: "left" }),
  },
  "routes/rings/mark.tsx": {
    at: (shop) => `/boards/${shop.boardId}/rings/${shop.photoId}`,
    get: "rings:read",
    post: "rings:read",
    form: () => ({ marks: JSON.stringify(marks) }),
  },
  "routes/holds/hold.ts": {
    at: (shop) => `/holds/${shop.holdId}`,
    post: "hold:change-own",
    form: () => ({ intent: "extend" }),
  },
  "routes/shop/settings.tsx": {
    at: () => "/settings",
    get: "shop:settings",
    post: "shop:settings",
    form: () => ({
      version: "1",
      name: "The shared shop",
      units: "in",
      currency: "USD",
      targetTemperatureC: "20",
      targetHumidityPct: "45",
      kerfMm: "1/8",
      endTrimMm: "1",
      allowanceLengthMm: "1",
      allowanceWidthMm: "1/4",
      allowanceThicknessMm: "1/8",
      jointPerFaceMm: "1/16",
      offcutMinLengthMm: "12",
      offcutMinWidthMm: "2",
      holdDays: "14",
      sawMaxHeightMm: "3",
      jointerMaxWidthMm: "8",
      jointerMinLengthMm: "12",
      planerMaxWidthMm: "15",
      planerMinLengthMm: "12",
      clamps: "20",
      flatBelowDeg: "30",
      quarteredAboveDeg: "60",
      labelSheet: "roll-62x29",
    }),
  },
  "routes/shop/people.tsx": {
    at: () => "/people",
    get: "shop:people",
    post: "shop:people",
    form: (shop) => ({ intent: "role", personId: shop.colleagueId, role: "maker" }),
  },
  "routes/scan/scan.tsx": { at: () => "/scan", get: "board:see" },
  "routes/tags/tags.tsx": { at: (shop) => `/tags?board=${shop.boardId}`, get: "tag:print" },
  "routes/deliveries/list.tsx": { at: () => "/deliveries", get: "delivery:see" },
  "routes/deliveries/new.tsx": {
    at: () => "/deliveries/new",
    get: "delivery:receive",
    post: "delivery:receive",
    form: delivery,
  },
  "routes/deliveries/delivery.tsx": {
    at: (shop) => `/deliveries/${shop.talliedId}`,
    get: "delivery:see",
    post: "delivery:receive",
  },
  "routes/deliveries/edit.tsx": {
    at: (shop) => `/deliveries/${shop.deliveryId}/edit`,
    get: "delivery:receive",
    post: "delivery:receive",
    form: delivery,
  },
  "routes/deliveries/delete.tsx": {
    at: (shop) => `/deliveries/${shop.deliveryId}/delete`,
    get: "delivery:delete",
    post: "delivery:delete",
  },
  "routes/deliveries/tally.tsx": {
    at: (shop) => `/deliveries/${shop.deliveryId}/tally`,
    get: "delivery:tally",
    post: "delivery:tally",
    form: () => ({ rows: JSON.stringify([tallyRow]), after: "" }),
  },
  "routes/deliveries/remove-document.tsx": {
    at: (shop) => `/deliveries/${shop.deliveryId}/documents/${shop.documentId}/remove`,
    get: "delivery:receive",
    post: "delivery:receive",
  },
  "routes/suppliers/list.tsx": { at: () => "/suppliers", get: "supplier:see" },
  "routes/suppliers/new.tsx": {
    at: () => "/suppliers/new",
    get: "supplier:change",
    post: "supplier:change",
    form: () => supplier,
  },
  "routes/suppliers/supplier.tsx": {
    at: (shop) => `/suppliers/${shop.supplierId}`,
    get: "supplier:change",
    post: "supplier:change",
    form: () => supplier,
  },
  "routes/projects/list.tsx": { at: () => "/projects", get: "project:see" },
  "routes/projects/new.tsx": {
    at: () => "/projects/new",
    get: "project:change",
    post: "project:change",
    form: () => project,
  },
  "routes/projects/project.tsx": { at: (shop) => `/projects/${shop.projectId}`, get: "project:see" },
  "routes/projects/change.tsx": {
    at: (shop) => `/projects/${shop.projectId}/change`,
    get: "project:change",
    post: "project:change",
    form: () => ({ ...project, version: "1" }),
  },
  "routes/projects/parts.tsx": {
    at: (shop) => `/projects/${shop.projectId}/parts`,
    get: "project:change",
    post: "project:change",
    form: () => ({
      name: "Rail",
      quantity: "2",
      thicknessMm: "1",
      widthMm: "3",
      lengthMm: "40",
      species: "white-oak",
      ringMinDeg: "0",
      ringMaxDeg: "90",
    }),
  },
  "routes/projects/plan.tsx": {
    at: (shop) => `/projects/${shop.projectId}/plan`,
    get: "project:change",
    post: "hold:place",
    form: (shop) => ({ stretches: JSON.stringify([{ boardId: shop.spareBoardId, fromMm: 0, toMm: 500 }]) }),
  },
  "routes/projects/take-down.tsx": { at: (shop) => `/projects/${shop.projectId}/take-down`, get: "board:take-down" },
  "routes/calculators/list.tsx": { at: () => "/calculators", get: "board:see" },
  ...Object.fromEntries(
    Object.values(calculators).map(({ path }) => [
      `routes${path}.tsx`,
      { at: () => path, get: "board:see" } satisfies AskedRoute,
    ]),
  ),
  "routes/files/boards-csv.ts": { at: () => "/files/boards.csv?state=any", get: "board:see" },
  "routes/files/deliveries-csv.ts": { at: () => "/files/deliveries.csv", get: "delivery:see" },
  "routes/files/document.ts": { at: (shop) => `/files/documents/${shop.documentId}`, get: "delivery:see" },
  "routes/files/tags-pdf.ts": { at: (shop) => `/files/tags.pdf?board=${shop.boardId}`, get: "tag:print" },
  "routes/files/photo.ts": { at: (shop) => `/files/photos/${shop.photoId}/original`, get: "board:see" },
  "routes/api/find-boards.ts": { at: () => "/api/boards?q=WO", get: "board:see" },
  "routes/api/availability.ts": { at: (shop) => `/api/boards/${shop.boardId}/availability`, get: "board:see" },
  "routes/api/begin-photo.ts": {
    at: (shop) => `/api/boards/${shop.boardId}/photos`,
    post: "photo:add",
    form: () => ({ json: { kind: "edge", ...upload } }),
  },
  "routes/api/confirm-photo.ts": {
    at: (shop) => `/api/photos/${shop.waitingPhotoId}/confirm`,
    post: "photo:add",
    form: () => ({ json: {} }),
  },
  "routes/api/read-rings.ts": {
    at: (shop) => `/api/photos/${shop.photoId}/rings`,
    post: "rings:read",
    form: () => ({ json: { corners } }),
  },
  "routes/api/tally-draft.ts": {
    at: (shop) => `/api/deliveries/${shop.deliveryId}/tally-draft`,
    get: "delivery:tally",
    post: "delivery:tally",
    form: () => ({ json: { rows: [tallyRow], version: 0, writer: "page", after: null } }),
  },
  "routes/api/begin-document.ts": {
    at: (shop) => `/api/deliveries/${shop.deliveryId}/documents`,
    post: "delivery:receive",
    form: () => ({ json: { name: "invoice.jpg", ...upload } }),
  },
  "routes/api/confirm-document.ts": {
    at: (shop) => `/api/documents/${shop.waitingDocumentId}/confirm`,
    post: "delivery:receive",
    form: () => ({ json: {} }),
  },
};

/** Routes that are open to strangers or belong to a person, not to a shop: what guards them is tested beside them. */
export const ofNoShop = [
  "routes/home.ts",
  "routes/sign-in/sign-in.tsx",
  "routes/sign-in/code.tsx",
  "routes/sign-in/link.tsx",
  "routes/sign-in/sign-out.ts",
  "routes/shops/choose.tsx",
  "routes/shops/new.tsx",
  "routes/invitation.tsx",
  "routes/account.tsx",
  "routes/shop/layout.tsx",
  "routes/api/layout.ts",
  "routes/not-here.tsx",
];
