import {
  type InputHTMLAttributes,
  type ReactNode,
  type SelectHTMLAttributes,
  type TextareaHTMLAttributes,
  useId,
} from "react";

const box =
  "min-h-11 w-full rounded-lg border border-line-strong bg-surface px-3 py-2 text-ink placeholder:text-ink-soft aria-invalid:border-2 aria-invalid:border-wrong";

interface Around {
  label: ReactNode;
  /** What is wrong, and what would be right. Conform hands in a list. */
  errors?: string[] | undefined;
  hint?: ReactNode;
  /** Text behind the box, such as a unit. */
  unit?: string;
}

interface FieldProps extends Around {
  controlId: string;
  className?: string;
  children: (described: { id: string; "aria-describedby"?: string; "aria-invalid"?: true }) => ReactNode;
}

/** Label, hint and message around one control, tied together for a screen reader. Every form field on every page is one. */
export function Field({ controlId, label, errors, hint, unit, className = "", children }: FieldProps) {
  const wrong = errors && errors.length > 0;
  const hintId = hint ? `${controlId}-hint` : undefined;
  const wrongId = wrong ? `${controlId}-wrong` : undefined;
  const described = [wrongId, hintId].filter(Boolean).join(" ");
  return (
    <div className={`grid content-start gap-1 ${className}`}>
      <label htmlFor={controlId} className="font-semibold text-sm">
        {label}
      </label>
      <div className="flex items-center gap-2">
        {children({
          id: controlId,
          "aria-describedby": described || undefined,
          "aria-invalid": wrong ? true : undefined,
        })}
        {unit ? <span className="shrink-0 text-ink-soft">{unit}</span> : null}
      </div>
      {wrong ? (
        <p id={wrongId} className="font-semibold text-sm text-wrong">
          {errors.join(" ")}
        </p>
      ) : null}
      {hint ? (
        <p id={hintId} className="text-ink-soft text-sm">
          {hint}
        </p>
      ) : null}
    </div>
  );
}

/** A line of text or a number. */
export function TextField({
  label,
  errors,
  hint,
  unit,
  className,
  ...input
}: Around & InputHTMLAttributes<HTMLInputElement>) {
  const made = useId();
  return (
    <Field controlId={input.id ?? made} {...{ label, errors, hint, unit, className }}>
      {(described) => <input {...input} {...described} className={box} />}
    </Field>
  );
}

/** A few lines of text. */
export function TextArea({
  label,
  errors,
  hint,
  unit,
  className,
  ...input
}: Around & TextareaHTMLAttributes<HTMLTextAreaElement>) {
  const made = useId();
  return (
    <Field controlId={input.id ?? made} {...{ label, errors, hint, unit, className }}>
      {(described) => <textarea rows={3} {...input} {...described} className={box} />}
    </Field>
  );
}

/** One of a few. Options are given as `<option>` children. */
export function SelectField({
  label,
  errors,
  hint,
  unit,
  className,
  ...input
}: Around & SelectHTMLAttributes<HTMLSelectElement>) {
  const made = useId();
  return (
    <Field controlId={input.id ?? made} {...{ label, errors, hint, unit, className }}>
      {(described) => <select {...input} {...described} className={box} />}
    </Field>
  );
}
