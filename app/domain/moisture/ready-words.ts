import { printDay } from "#app/components/when.tsx";
import { dateOf, type ReadyView } from "./ready.ts";

/** The answer in a line, and the range and cautions behind it. Never more certain than the readings are. */
export interface ReadyWords {
  headline: string;
  detail: string | null;
  cautions: string[];
}

/** Says what the readings tell of the day that wood is ready. */
export function readyWords(view: ReadyView): ReadyWords {
  const { forecast, readyDay } = view;
  const cautions = [forecast.outsideRange, doubtedWords(view)];
  const settle = `It settles near ${view.emcPct.toFixed(1)} % here, outside the target: work it while it is within.`;
  switch (forecast.state) {
    case "ready":
      return {
        headline: "Ready",
        detail: forecast.staysReady ? "It stays within the target in this air." : null,
        cautions: said([...cautions, forecast.staysReady ? null : settle]),
      };
    case "forecast": {
      const [likely, earliest, latest] = readyDay ? [readyDay.likely, readyDay.earliest, readyDay.latest] : [0, 0, 0];
      return {
        headline: `Ready about ${dayWords(view, likely)}`,
        detail: `Nine times in ten between ${dayWords(view, earliest)} and ${dayWords(view, latest)}.`,
        cautions: said([...cautions, forecast.furtherThanData, forecast.staysReady ? null : settle]),
      };
    }
    case "never-here":
      return { headline: "Not in this air", detail: forecast.why, cautions: said(cautions) };
    case "not-yet-known":
      return { headline: nowWords[forecast.now ?? "unknown"], detail: forecast.why, cautions: said(cautions) };
  }
}

const nowWords = {
  ready: "Within the target by its last reading; whether it stays is not yet known",
  "too-wet": "Too wet now; the day is not yet known",
  "too-dry": "Too dry now; the day is not yet known",
  unknown: "Not yet known",
} as const;

function dayWords(view: ReadyView, day: number): string {
  const date = dateOf(view, day);
  return date ? printDay(date) : `day ${Math.round(day)}`;
}

function doubtedWords({ readings }: ReadyView): string | null {
  const doubted = readings.filter(({ isDoubted }) => isDoubted).length;
  if (doubted === 0) return null;
  return doubted === 1
    ? "One reading is so far off the others that it was left out."
    : `${doubted} readings are so far off the others that they were left out.`;
}

function said(cautions: (string | null)[]): string[] {
  return cautions.filter((caution) => caution !== null);
}
