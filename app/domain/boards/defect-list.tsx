import { Form, href, Link } from "react-router";
import { Card } from "#app/components/card.tsx";
import { toPanel } from "#app/components/panel.tsx";
import { SureButton } from "#app/components/sure-button.tsx";
import { speciesTints } from "#app/domain/species/species-tints.ts";
import type { Board } from "./board.ts";
import type { Defect } from "./defect.ts";
import { LengthText } from "./size-text.tsx";

interface DefectListProps {
  board: Board;
  defects: Defect[];
  mayNote: boolean;
}

/** Where on the board something is wrong: drawn on its face, and in words. */
export function DefectList({ board, defects, mayNote }: DefectListProps) {
  const note = mayNote ? (
    <Link
      to={href("/boards/:boardId/defects", { boardId: board.id }) + toPanel}
      className="inline-flex min-h-11 items-center text-link underline-offset-4 hover:underline"
    >
      Note a defect
    </Link>
  ) : null;
  return (
    <Card title="Defects" aside={note}>
      {defects.length === 0 ? (
        <p className="text-ink-soft">None noted.</p>
      ) : (
        <>
          <FaceDrawing board={board} defects={defects} />
          <ul className="mt-3 grid gap-2">
            {defects.map((defect) => (
              <li key={defect.id} className="flex flex-wrap items-center justify-between gap-2">
                <span>
                  <strong>{defect.kind}</strong>, {defect.face === "both" ? "both faces" : `${defect.face} face`},{" "}
                  <LengthText mm={defect.alongMm} /> from the near end, <LengthText mm={defect.lengthMm} unit={false} />{" "}
                  × <LengthText mm={defect.widthMm} />
                  {defect.note ? `. ${defect.note}` : ""}
                </span>
                {mayNote ? (
                  <Form method="post" action={href("/boards/:boardId/defects", { boardId: board.id })}>
                    <input type="hidden" name="remove" value={defect.id} />
                    <SureButton look="quiet" aria-label={`Remove ${defect.kind}`} sure="Press again to remove">
                      Remove
                    </SureButton>
                  </Form>
                ) : null}
              </li>
            ))}
          </ul>
        </>
      )}
    </Card>
  );
}

function FaceDrawing({ board, defects }: { board: Board; defects: Defect[] }) {
  const width = Math.max(board.widthMm, board.widthFarMm ?? 0);
  return (
    <svg
      viewBox={`0 0 ${board.lengthMm} ${width}`}
      preserveAspectRatio="none"
      className="block h-20 w-full rounded border border-line-strong"
      role="img"
      aria-label={`The face of the board with ${defects.length} defects`}
    >
      <rect width={board.lengthMm} height={width} fill={speciesTints(board.species).base} />
      {defects.map((defect) => (
        <rect
          key={defect.id}
          x={defect.alongMm}
          y={defect.acrossMm}
          width={Math.max(defect.lengthMm, board.lengthMm / 200)}
          height={Math.max(defect.widthMm, width / 30)}
          fill="#4a2d16"
          fillOpacity="0.55"
          stroke="#1b0f06"
          strokeWidth="2"
          vectorEffect="non-scaling-stroke"
        />
      ))}
    </svg>
  );
}
