import { useState } from "react";
import { href, Link, useRevalidator } from "react-router";
import { Card } from "#app/components/card.tsx";
import { PickFile } from "#app/components/pick-file.tsx";
import { Sending, type SendStage } from "#app/components/sending.tsx";
import { printDay } from "#app/components/when.tsx";
import { type DeliveryDocument, documentTypes, printBytes } from "./document.ts";
import { sendDocument } from "./send-document.ts";

interface DocumentListProps {
  deliveryId: string;
  documents: DeliveryDocument[];
  mayChange: boolean;
}

/** The papers of a delivery, and the way to add one from a file or a phone's camera. */
export function DocumentList({ deliveryId, documents, mayChange }: DocumentListProps) {
  return (
    <Card title="Documents" aside={documents.length > 0 ? documents.length : null}>
      {documents.length === 0 ? (
        <p className="text-ink-soft">None yet. The invoice, the tally sheet, a certificate of origin.</p>
      ) : (
        <ul className="divide-y divide-line">
          {documents.map((document) => (
            <li key={document.id} className="flex flex-wrap items-center justify-between gap-x-4 py-1.5">
              <span className="min-w-0">
                <a
                  href={href("/files/documents/:documentId", { documentId: document.id })}
                  className="inline-flex min-h-11 items-center break-all text-link underline"
                >
                  {document.name}
                </a>
                <span className="block text-ink-soft text-sm">
                  {printBytes(document.bytes)}, {document.addedBy}, {printDay(document.addedAt)}
                </span>
              </span>
              {mayChange ? (
                <Link
                  to={href("/deliveries/:deliveryId/documents/:documentId/remove", {
                    deliveryId,
                    documentId: document.id,
                  })}
                  aria-label={`Remove ${document.name}`}
                  className="inline-flex min-h-11 items-center px-2 text-link underline-offset-4 hover:underline"
                >
                  Remove
                </Link>
              ) : null}
            </li>
          ))}
        </ul>
      )}
      {mayChange ? <AddDocument deliveryId={deliveryId} /> : null}
    </Card>
  );
}

function AddDocument({ deliveryId }: { deliveryId: string }) {
  const [stage, setStage] = useState<SendStage>({ at: "idle" });
  const { revalidate } = useRevalidator();

  async function send(file: File) {
    setStage({ at: "sending", share: 0 });
    const refused = await sendDocument(file, deliveryId, (share) => setStage({ at: "sending", share }));
    if (refused) return setStage({ at: "refused", ...refused, file });
    await revalidate();
    setStage({ at: "idle" });
  }

  const busy = stage.at === "sending";
  return (
    <div className="mt-3 grid gap-3 border-line border-t pt-4" data-screen-only>
      <div className="flex flex-wrap gap-3">
        <PickFile label="Add a PDF or picture" accept={documentTypes} disabled={busy} onPick={send} />
      </div>
      <Sending what="document" stage={stage} onAgain={send} />
    </div>
  );
}
