import { printDay } from "#app/components/when.tsx";
import type { LengthUnit } from "#app/core/lengths/length-unit.ts";
import { printLength } from "#app/core/lengths/print-length.ts";
import { readingSources, readingWords } from "#app/domain/rings/reading.ts";

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

/** Keys of figures end in their unit: lengths are kept in millimetres and shown in the shop's units. */
const keyWithUnit = /^(.*) \((mm|%|degrees)\)$/;
const day = /^\d{4}-\d{2}-\d{2}$/;

/** Values that need no name before them: the heading says what they are. */
const nameless = new Set(["kind", "project", "tag"]);

/** What changed, in words: "width 8 1/4 in → 8 in", or values side by side: "Chapel stools, from 0 in, to 60 in, until 15 Dec 2026". */
export function eventWords(detail: EventDetail, units: LengthUnit): string {
  return Object.entries(detail)
    .filter(([, value]) => value !== null && value !== "")
    .map(([key, value]) => {
      const [, bare, unit] = keyWithUnit.exec(key) ?? [];
      const name = bare ?? key;
      const print = (side: string | number | null) => printValue(side, unit, units);
      if (Array.isArray(value)) return `${name} ${print(value[0])} → ${print(value[1])}`;
      if (name === "note") return `“${value}”`;
      if (name === "end") return `${value} end`;
      if (name === "how") return howRead(String(value));
      return nameless.has(name) ? print(value) : `${name} ${print(value)}`;
    })
    .join(", ");
}

function printValue(value: string | number | null, unit: string | undefined, units: LengthUnit): string {
  if (value === null || value === "") return "none";
  if (typeof value === "string") return day.test(value) ? printDay(value) : value;
  if (unit === "mm") return `${printLength(value, units)} ${units}`;
  if (unit === "%") return `${value} %`;
  return unit === "degrees" ? `${value}°` : String(value);
}

function howRead(source: string): string {
  const known = readingSources.find((one) => one === source);
  return known ? readingWords(known) : source;
}
