import { buttonClass } from "#app/components/button.tsx";

const inchKeys = ["¼", "½", "¾", "⅛", "⅜", "⅝", "⅞", "'", '"', "x"];
const metricKeys = ["x"];
const said: Record<string, string> = { "'": "feet", '"': "inches", x: "by" };

interface TallyKeysProps {
  /** The box that they type into: the one with the focus. */
  boxId: string;
  isInches: boolean;
  onNext: () => void;
  onType: (value: string) => void;
}

/**
 * Keys that a phone's pad of figures lacks, under the row in hand: fractions, marks, and the way on, since some pads have no Enter.
 * They leave the focus, and so the pad, where it is.
 */
export function TallyKeys({ boxId, isInches, onNext, onType }: TallyKeysProps) {
  const key = buttonClass("plain", "!min-w-11 shrink-0 !px-2 text-lg");
  function type(sign: string) {
    const box = document.getElementById(boxId);
    if (!(box instanceof HTMLInputElement)) return;
    const from = box.selectionStart ?? box.value.length;
    const to = box.selectionEnd ?? from;
    onType(box.value.slice(0, from) + sign + box.value.slice(to));
    requestAnimationFrame(() => box.setSelectionRange(from + sign.length, from + sign.length));
  }
  return (
    <div className="mt-2 hidden gap-1.5 pointer-coarse:flex">
      <button
        type="button"
        tabIndex={-1}
        className={buttonClass("main", "shrink-0")}
        onPointerDown={(event) => event.preventDefault()}
        onClick={onNext}
      >
        Next
      </button>
      <div className="flex gap-1.5 overflow-x-auto">
        {(isInches ? inchKeys : metricKeys).map((sign) => (
          <button
            key={sign}
            type="button"
            tabIndex={-1}
            aria-label={said[sign]}
            className={key}
            onPointerDown={(event) => event.preventDefault()}
            onClick={() => type(sign)}
          >
            {sign}
          </button>
        ))}
      </div>
    </div>
  );
}
