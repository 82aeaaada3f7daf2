import { Form, href, Link } from "react-router";
import { Card } from "#app/components/card.tsx";
import { SureButton } from "#app/components/sure-button.tsx";
import { When } from "#app/components/when.tsx";
import { AddPhoto } from "./add-photo.tsx";
import type { Photo } from "./photo.ts";

interface PhotoStripProps {
  boardId: string;
  tag: string;
  photos: Photo[];
  mayRemove: boolean;
}

/** A board's photos, and the way to add one from a phone's camera or a file. */
export function PhotoStrip({ boardId, tag, photos, mayRemove }: PhotoStripProps) {
  return (
    <Card title="Photos" aside={photos.length > 0 ? photos.length : null}>
      {photos.length === 0 ? (
        <p className="mb-3 text-ink-soft">
          None yet. An end, square on and filling the picture, is the one that tells most.
        </p>
      ) : null}
      <ul className="grid grid-cols-2 gap-3 sm:grid-cols-3">
        {photos.map((photo) => (
          <li key={photo.id} className="grid content-start gap-1">
            <a href={href("/files/photos/:photoId/:size", { photoId: photo.id, size: "screen" })} className="block">
              <img
                src={href("/files/photos/:photoId/:size", { photoId: photo.id, size: "small" })}
                alt={`${tag}, ${photo.kind}`}
                width={400}
                height={Math.round((400 * photo.heightPx) / photo.widthPx)}
                loading="lazy"
                className="aspect-4/3 w-full rounded-lg bg-sunk object-cover"
              />
            </a>
            <p className="font-semibold">{photo.kind}</p>
            <p className="text-ink-soft text-sm">
              {photo.generated ? "drawn by a program" : <When at={photo.addedAt} />}
            </p>
            <div className="flex flex-wrap items-center gap-x-2">
              {photo.kind.endsWith("end") ? (
                <Link
                  to={href("/boards/:boardId/rings/:photoId", { boardId, photoId: photo.id })}
                  className="inline-flex min-h-11 items-center text-link underline"
                  data-screen-only
                >
                  Mark the rings
                </Link>
              ) : null}
              {mayRemove ? (
                <Form
                  method="post"
                  action={href("/boards/:boardId/photos/:photoId/remove", { boardId, photoId: photo.id })}
                >
                  <SureButton look="quiet" aria-label={`Remove ${photo.kind} photo`} sure="Press again to remove">
                    Remove
                  </SureButton>
                </Form>
              ) : null}
            </div>
          </li>
        ))}
      </ul>
      <AddPhoto boardId={boardId} hasNearEnd={photos.some((photo) => photo.kind === "near end")} />
    </Card>
  );
}
