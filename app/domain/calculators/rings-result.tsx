import { Figures } from "#app/components/figures.tsx";
import type { ClassShares } from "#app/core/rings/ring-types.ts";
import type { Strip } from "#app/core/rings/strips.ts";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { Definitions } from "./definitions.tsx";
import { EndSketch } from "./end-sketch.tsx";
import type { RingsAnswer } from "./rings.ts";

/** The angles across the end and its class here; the best strip; then what each published definition would call it. */
export function RingsResult({ answer }: { answer: RingsAnswer }) {
  const { classLimits } = useShop();
  const { field, summary, shares, strip } = answer;
  return (
    <>
      <Figures
        title="The end"
        main={{ label: "Rings to the wide face", value: `${summary.least}° to ${summary.greatest}°` }}
        drawing={
          <>
            <EndSketch field={field}>
              {(perPx) =>
                strip?.ok ? <StripMark strip={strip.strip} heightMm={field.thicknessMm} perPx={perPx} /> : null
              }
            </EndSketch>
            <ol
              className="mt-1 flex justify-between font-mono text-sm"
              aria-label="Ring angle across the end, left to right"
            >
              {field.stations.map(({ position, angleDeg }) => (
                <li key={position} className="flex-1 text-center">
                  {Math.round(angleDeg)}°
                </li>
              ))}
            </ol>
          </>
        }
        rows={[
          { label: "Called here", value: answer.ringClass },
          { label: "Shares of the end", value: shareWords(shares) },
          {
            label: "This shop's limits",
            value: `flat below ${classLimits.flatBelowDeg}°, quartered above ${classLimits.quarteredAboveDeg}°`,
          },
        ]}
      />
      {strip ? <StripFigures answer={answer} /> : null}
      <Definitions published={answer.published} />
    </>
  );
}

function shareWords({ flat, rift, quartered }: ClassShares): string {
  const percent = (share: number) => `${Math.round(share * 100)} %`;
  return `flat ${percent(flat)}, rift ${percent(rift)}, quartered ${percent(quartered)}`;
}

function StripFigures({ answer: { strip, stripsSideBySide } }: { answer: RingsAnswer }) {
  if (!strip) return null;
  if (!strip.ok) return <Figures title="Best strip" rows={[{ label: "None", value: strip.why }]} />;
  const { share, suits, leastDeg, greatestDeg, rips, fromMm, toMm } = strip.strip;
  return (
    <Figures
      title="Best strip"
      main={{
        label: suits ? "It meets the demand" : "The nearest there is",
        value: `${Math.round(share * 100)} % within the window`,
      }}
      rows={[
        { label: "Its rings", value: `${leastDeg.toFixed(0)}° to ${greatestDeg.toFixed(0)}°` },
        {
          label: "From the left edge",
          value: (
            <>
              <LengthText mm={fromMm} unit={false} /> to <LengthText mm={toMm} />
            </>
          ),
        },
        {
          label: "Rip",
          value:
            rips.length === 0
              ? "not at all: the whole board"
              : rips.map(({ atMm, away }, index) => (
                  <span key={away}>
                    {index > 0 ? "; " : ""}at <LengthText mm={atMm} />, the {away} side away
                  </span>
                )),
        },
        { label: "Such strips side by side", value: stripsSideBySide },
      ]}
    />
  );
}

/** The strip as crayon lines down the end where it is to be ripped. */
function StripMark({ strip: { fromMm, toMm }, heightMm, perPx }: { strip: Strip; heightMm: number; perPx: number }) {
  return (
    <>
      <rect x={fromMm} y="0" width={toMm - fromMm} height={heightMm} fill="#1d4ed8" fillOpacity="0.12" />
      <path
        d={`M${fromMm} 0V${heightMm}M${toMm} 0V${heightMm}`}
        stroke="#1d4ed8"
        strokeWidth={4 * perPx}
        strokeDasharray={`${14 * perPx} ${8 * perPx}`}
      />
    </>
  );
}
