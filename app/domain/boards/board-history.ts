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

/** What changed, in words: "width 210 → 205", or named values side by side. */
export function eventWords(detail: EventDetail): string {
  return Object.entries(detail)
    .filter(([, value]) => value !== null && value !== "")
    .map(([name, value]) => {
      if (!Array.isArray(value)) return name === "note" ? `“${value}”` : `${name} ${value}`;
      const [before, after] = value.map((side) => (side === null || side === "" ? "none" : String(side)));
      return `${name} ${before} → ${after}`;
    })
    .join(", ");
}
