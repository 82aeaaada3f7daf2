import { Form, href, Link } from "react-router";
import { Card } from "#app/components/card.tsx";
import { toPanel } from "#app/components/panel.tsx";
import { SureButton } from "#app/components/sure-button.tsx";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { Part } from "./project.ts";

interface PartsTableProps {
  parts: Part[];
  projectId: string;
  mayChange: boolean;
}

/** What the project is made of: finished sizes and the ring angles each part asks for. */
export function PartsTable({ parts, projectId, mayChange }: PartsTableProps) {
  const add = mayChange ? (
    <Link
      to={href("/projects/:projectId/parts", { projectId }) + toPanel}
      className="inline-flex min-h-11 items-center text-link underline-offset-4 hover:underline"
    >
      Add a part
    </Link>
  ) : null;
  return (
    <Card title="Parts" aside={add}>
      {parts.length === 0 ? (
        <p className="text-ink-soft">
          None listed. A part says how many, how large when finished, and how its rings must run.
        </p>
      ) : (
        <ul className="divide-y divide-line">
          {parts.map((part) => (
            <li key={part.id} className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 py-2">
              <div>
                <p>
                  <strong>
                    {part.quantity} × {part.name}
                  </strong>{" "}
                  <span className="text-ink-soft">{speciesName(part.species)}</span>
                </p>
                <p>
                  <LengthText mm={part.thicknessMm} unit={false} /> × <LengthText mm={part.widthMm} unit={false} /> ×{" "}
                  <LengthText mm={part.lengthMm} />
                  <span className="text-ink-soft">, {ringsAsked(part)}</span>
                </p>
              </div>
              {mayChange ? (
                <Form method="post" action={href("/projects/:projectId/parts", { projectId })}>
                  <input type="hidden" name="remove" value={part.id} />
                  <SureButton look="quiet" aria-label={`Remove ${part.name}`} sure="Press again to remove">
                    Remove
                  </SureButton>
                </Form>
              ) : null}
            </li>
          ))}
        </ul>
      )}
    </Card>
  );
}

function ringsAsked({ ringMinDeg, ringMaxDeg }: Part): string {
  if (ringMinDeg === 0 && ringMaxDeg === 90) return "rings any way";
  return `rings ${ringMinDeg}° to ${ringMaxDeg}° to the face`;
}
