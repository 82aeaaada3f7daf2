import { useQueryClient } from "@tanstack/react-query";
import { useState } from "react";
import { href, useNavigate, useRevalidator } from "react-router";
import { Button, buttonClass } from "#app/components/button.tsx";
import { SelectField } from "#app/components/field.tsx";
import { Notice } from "#app/components/notice.tsx";
import { type PhotoKind, photoKinds } from "./photo.ts";
import { sendPhoto } from "./send-photo.ts";

type Stage = { at: "idle" } | { at: "sending"; share: number } | { at: "refused"; words: string; file: File };

/** Adds a photo: choose what it shows, then camera or file; it goes straight to the file store while a bar shows how far. */
export function AddPhoto({ boardId, hasNearEnd }: { boardId: string; hasNearEnd: boolean }) {
  const [kind, setKind] = useState<PhotoKind>(hasNearEnd ? "heart face" : "near end");
  const [stage, setStage] = useState<Stage>({ at: "idle" });
  const { revalidate } = useRevalidator();
  const navigate = useNavigate();
  const queries = useQueryClient();

  async function send(file: File) {
    setStage({ at: "sending", share: 0 });
    const sent = await sendPhoto(file, { boardId, kind }, (share) => setStage({ at: "sending", share }));
    if (!sent.ok) return setStage({ at: "refused", words: sent.words, file });
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
        <PickFile label="Take a photo" camera disabled={stage.at === "sending"} onPick={send} />
        <PickFile label="Choose a file" disabled={stage.at === "sending"} onPick={send} />
      </div>
      {stage.at === "sending" ? (
        <div className="grid gap-1">
          <progress value={stage.share} max={1} className="h-3 w-full accent-action" aria-label="Sending the photo" />
          <p className="text-ink-soft">
            {stage.share < 1 ? `Sending, ${Math.round(stage.share * 100)} %` : "Looking at it"}
          </p>
        </div>
      ) : null}
      {stage.at === "refused" ? (
        <Notice kind="wrong" title={stage.words}>
          <Button type="button" className="mt-2" onClick={() => send(stage.file)}>
            Send it again
          </Button>
        </Notice>
      ) : null}
    </div>
  );
}

interface PickFileProps {
  label: string;
  camera?: boolean;
  disabled: boolean;
  onPick: (file: File) => void;
}

/** A file input that looks like a button; the input stays in reach of the keyboard. */
function PickFile({ label, camera, disabled, onPick }: PickFileProps) {
  return (
    <label
      className={buttonClass(
        camera ? "main" : "plain",
        "relative cursor-pointer has-focus-visible:outline-3 has-focus-visible:outline-focus",
      )}
    >
      {label}
      <input
        type="file"
        accept="image/jpeg,image/png,image/webp,image/avif"
        capture={camera ? "environment" : undefined}
        disabled={disabled}
        className="absolute inset-0 cursor-pointer opacity-0"
        onChange={(event) => {
          const file = event.target.files?.[0];
          event.target.value = "";
          if (file) onPick(file);
        }}
      />
    </label>
  );
}
