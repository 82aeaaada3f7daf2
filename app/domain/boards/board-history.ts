import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { printLength } from "#app/core/lengths/print-length.ts";

/** What can happen to a board, each with the words its history shows. */
const kinds = {
  received: "Received",
  corrected: "Corrected",
  moved: "Moved",
  photographed: "Photographed",
  "photo removed": "Photo removed",
  "rings read": "Rings read",
  metered: "Moisture read",
  "defect noted": "Defect noted",
  "defect removed": "Defect removed",
  reserved: "Reserved",
  "hold extended": "Hold extended",
  "let go": "Let go",
  lapsed: "Hold lapsed",
  "taken down": "Taken down",
  "put back": "Put back",
  used: "Used",
  marked: "Marked",
  deleted: "Deleted",
  "offcut made": "Offcut made",
} as const;

export type BoardEventKind = keyof typeof kinds;

/** Plain facts of an event: field changes as [before, after], or named values. */
export type EventDetail = Record<string, string | number | null | [string | number | null, string | number | null]>;

/** One line of history as the page shows it. */
export interface BoardEvent {
  id: string;
  kind: BoardEventKind;
  detail: EventDetail;
  byName: string | null;
  at: Date;
}

/** The heading of a history line. */
export function eventTitle(kind: BoardEventKind): string {
  return kinds[kind];
}

/** Keys of lengths say so, as they are kept in millimetres and shown in the shop's units. */
const inMillimetres = " (mm)";

/** What changed, in words: "width 8 1/4 in → 8 in", or named values side by side. */
export function eventWords(detail: EventDetail, units: LengthUnit): string {
  return Object.entries(detail)
    .filter(([, value]) => value !== null && value !== "")
    .map(([key, value]) => {
      const isLength = key.endsWith(inMillimetres);
      const name = isLength ? key.slice(0, -inMillimetres.length) : key;
      const print = (side: string | number | null) => {
        if (side === null || side === "") return "none";
        return isLength && typeof side === "number" ? `${printLength(side, units)} ${units}` : String(side);
      };
      if (Array.isArray(value)) return `${name} ${print(value[0])} → ${print(value[1])}`;
      return name === "note" ? `“${value}”` : `${name} ${print(value)}`;
    })
    .join(", ");
}
