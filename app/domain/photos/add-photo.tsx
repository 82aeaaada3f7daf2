import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { href, useNavigate, useRevalidator } from "react-router";
import { SelectField } from "#app/components/field.tsx";
import { PickFile } from "#app/components/pick-file.tsx";
import { Sending, type SendStage } from "#app/components/sending.tsx";
import { type PhotoKind, photoKinds } from "./photo.ts";
import { sendPhoto } from "./send-photo.ts";

const pictures = "image/jpeg,image/png,image/webp,image/avif";

/** Adds a photo: choose what it shows, then camera or file; it goes straight to the file store while a bar shows how far. */
export function AddPhoto({ boardId, hasNearEnd }: { boardId: string; hasNearEnd: boolean }) {
  const [kind, setKind] = useState<PhotoKind>(hasNearEnd ? "heart face" : "near end");
  const [stage, setStage] = useState<SendStage>({ at: "idle" });
  const { revalidate } = useRevalidator();
  const navigate = useNavigate();
  const queries = useQueryClient();

  async function send(file: File) {
    setStage({ at: "sending", share: 0 });
    const sent = await sendPhoto(file, { boardId, kind }, (share) => setStage({ at: "sending", share }));
    if (!sent.ok) return setStage({ at: "refused", words: sent.words, isWorthAgain: sent.isWorthAgain, file });
    setStage({ at: "idle" });
    await queries.invalidateQueries({ queryKey: ["boards", boardId] });
    // An end is photographed to read its rings: that is the next step.
    if (kind === "near end" || kind === "far end")
      return navigate(href("/boards/:boardId/rings/:photoId", { boardId, photoId: sent.photoId }));
    await revalidate();
  }

  return (
    <div className="mt-4 grid gap-3 border-line border-t pt-4" data-screen-only>
      <div className="grid gap-3 sm:flex sm:items-end">
        <SelectField
          label="What it shows"
          value={kind}
          onChange={(event) => setKind(event.target.value as PhotoKind)}
          className="sm:w-56"
        >
          {photoKinds.map((name) => (
            <option key={name}>{name}</option>
          ))}
        </SelectField>
        <PickFile label="Take a photo" accept={pictures} camera disabled={stage.at === "sending"} onPick={send} />
        <PickFile label="Choose a file" accept={pictures} disabled={stage.at === "sending"} onPick={send} />
      </div>
      <Sending what="photo" stage={stage} onAgain={send} />
    </div>
  );
}
