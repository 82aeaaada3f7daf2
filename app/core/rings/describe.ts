import type { ClassLimits, RingClass, RingField } from "./ring-types.ts";
import { angleSummary, dominantClass } from "./summary.ts";

/** What a list knows of a board's rings. */
export interface EndSummary {
  ringClass: RingClass;
  leastDeg: number;
  greatestDeg: number;
}

/** What an end drawing shows, for those who cannot see it: "end grain: rift, 33° to 60°". Null stands for an end nobody has read. */
export function describeEnd(end: EndSummary | null): string {
  if (!end) return "end grain: not read yet";
  const [least, greatest] = [Math.round(end.leastDeg), Math.round(end.greatestDeg)];
  return `end grain: ${end.ringClass}, ${least === greatest ? `${least}°` : `${least}° to ${greatest}°`}`;
}

/** The same from the reading itself, under a shop's class limits. */
export function describeField(field: RingField, limits: ClassLimits): string {
  const { least, greatest } = angleSummary(field);
  return describeEnd({ ringClass: dominantClass(field, limits), leastDeg: least, greatestDeg: greatest });
}
