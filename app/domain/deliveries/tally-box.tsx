import type { KeyboardEvent } from "react";

interface TallyBoxProps {
  id: string;
  label: string;
  value: string;
  /** Id of the message about what cannot be read in it. */
  describedBy: string | undefined;
  placeholder?: string;
  onChange: (value: string) => void;
  onFocus: () => void;
  onBlur: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
  /** Whether pasted text is for more than this box, and what then takes it. */
  takesPaste?: (text: string) => boolean;
  onLines?: (text: string) => void;
}

/** One box of a tally's row. Figures come up on a phone; fractions and marks are the keys under the row. */
export function TallyBox({ id, label, describedBy, onChange, takesPaste, onLines, ...input }: TallyBoxProps) {
  return (
    <input
      {...input}
      id={id}
      aria-label={label}
      aria-invalid={describedBy ? true : undefined}
      aria-describedby={describedBy}
      inputMode="decimal"
      enterKeyHint="next"
      autoComplete="off"
      autoCorrect="off"
      spellCheck={false}
      maxLength={60}
      className="min-h-11 w-full min-w-0 rounded-lg border border-line-strong bg-surface px-2 font-mono placeholder:text-ink-soft aria-invalid:border-2 aria-invalid:border-wrong"
      onChange={(event) => onChange(event.target.value)}
      onPaste={(event) => {
        const text = event.clipboardData.getData("text/plain");
        if (!takesPaste?.(text)) return;
        event.preventDefault();
        onLines?.(text);
      }}
    />
  );
}
