import { Card } from "#app/components/card.tsx";
import { ringDefinitions } from "#app/core/rings/definitions.ts";
import { confidenceWords } from "#app/domain/sources/source.ts";
import type { RingsAnswer } from "./rings.ts";

/** The published definitions side by side, each with what it would call this end. They disagree; the shop has chosen its own. */
export function Definitions({ published }: Pick<RingsAnswer, "published">) {
  return (
    <Card title="What others would call it">
      <ul className="divide-y divide-line">
        {ringDefinitions.map(({ source, flat, rift, quartered, note, confidence }) => {
          const here = published.find((row) => row.source === source);
          return (
            <li key={source} className="py-3">
              <p className="flex flex-wrap justify-between gap-x-4">
                <span>{source}</span>
                <strong>
                  {here?.ringClass && here.shares
                    ? `${here.ringClass}, ${Math.round(here.shares[here.ringClass] * 100)} %`
                    : "names no angles"}
                </strong>
              </p>
              <p className="text-ink-soft">
                {[
                  flat ? `flat: ${flat}` : null,
                  rift ? `rift: ${rift}` : null,
                  quartered ? `quartered: ${quartered}` : null,
                ]
                  .filter(Boolean)
                  .join("; ")}
                . {note} ({confidenceWords(confidence === "secondary" ? "confirmed-secondary" : confidence)})
              </p>
            </li>
          );
        })}
      </ul>
    </Card>
  );
}
