import { type ReactNode, useState } from "react";

interface TallyChoiceProps {
  id: string;
  label: string;
  className?: string;
  value: string;
  /** How the value reads while the whole list is not there. */
  shown: string;
  /** Whether the value is one of the list; another is shown too, for somebody to change. */
  isListed: boolean;
  /** Id of the message about what is wrong with it. */
  describedBy: string | undefined;
  onChange: (value: string) => void;
  onEnter: () => void;
  children: ReactNode;
}

/** A select whose options come when somebody goes to it: two hundred rows of every species would make a phone slow. */
export function TallyChoice(props: TallyChoiceProps) {
  const { id, label, className = "", value, shown, isListed, describedBy, onChange, onEnter, children } = props;
  const [isOpen, setOpen] = useState(false);
  const open = () => setOpen(true);
  return (
    <select
      id={id}
      aria-label={label}
      aria-invalid={describedBy ? true : undefined}
      aria-describedby={describedBy}
      value={value}
      className={`min-h-11 min-w-0 rounded-lg border border-line-strong bg-surface px-2 aria-invalid:border-2 aria-invalid:border-wrong ${className}`}
      onFocus={open}
      onPointerDown={open}
      onChange={(event) => onChange(event.target.value)}
      onKeyDown={(event) => {
        if (event.key !== "Enter") return;
        event.preventDefault();
        onEnter();
      }}
    >
      {isOpen && isListed ? null : <option value={value}>{value === "" ? "choose" : shown}</option>}
      {isOpen ? children : null}
    </select>
  );
}
