import type { KeyboardEvent } from "react";

interface TallyBoxProps {
  id: string;
  label: string;
  value: string;
  message: string | undefined;
  placeholder?: string;
  onChange: (value: string) => void;
  onFocus: () => void;
  onBlur: () => void;
  onKeyDown: (event: KeyboardEvent) => void;
  /** Takes what was pasted, if it says so. */
  onPaste?: (text: string) => boolean;
}

/** One box of a tally's row. Figures come up on a phone; fractions and marks are the keys under the row. */
export function TallyBox({ id, label, message, onChange, onPaste, ...input }: TallyBoxProps) {
  return (
    <span className="grid min-w-0 content-start">
      <input
        {...input}
        id={id}
        aria-label={label}
        aria-invalid={message ? true : undefined}
        aria-describedby={message ? `${id}-wrong` : undefined}
        inputMode="decimal"
        enterKeyHint="next"
        autoComplete="off"
        autoCorrect="off"
        spellCheck={false}
        maxLength={60}
        className="min-h-11 w-full min-w-0 rounded-lg border border-line-strong bg-surface px-2 font-mono placeholder:text-ink-soft aria-invalid:border-2 aria-invalid:border-wrong"
        onChange={(event) => onChange(event.target.value)}
        onPaste={(event) => {
          if (onPaste?.(event.clipboardData.getData("text/plain"))) event.preventDefault();
        }}
      />
      {message ? (
        <span id={`${id}-wrong`} className="font-semibold text-sm text-wrong">
          {message}
        </span>
      ) : null}
    </span>
  );
}
