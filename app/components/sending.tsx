import { Button } from "./button.tsx";
import { Notice } from "./notice.tsx";

/** How far a file is on its way, or why it was refused. */
export type SendStage =
  | { at: "idle" }
  | { at: "sending"; share: number }
  | { at: "refused"; words: string; file: File; isWorthAgain: boolean };

interface SendingProps {
  /** What is sent: "photo". */
  what: string;
  stage: SendStage;
  onAgain: (file: File) => void;
}

/** The bar while a file is sent; when it was refused, why, and the way to send it again, where the same file can succeed. */
export function Sending({ what, stage, onAgain }: SendingProps) {
  if (stage.at === "idle") return null;
  if (stage.at === "refused")
    return (
      <Notice kind="wrong" title={stage.words}>
        {stage.isWorthAgain ? (
          <Button type="button" className="mt-2" onClick={() => onAgain(stage.file)}>
            Send it again
          </Button>
        ) : null}
      </Notice>
    );
  return (
    <div className="grid gap-1">
      <progress value={stage.share} max={1} className="h-3 w-full accent-action" aria-label={`Sending the ${what}`} />
      <p className="text-ink-soft">
        {stage.share < 1 ? `Sending, ${Math.round(stage.share * 100)} %` : "Looking at it"}
      </p>
    </div>
  );
}
