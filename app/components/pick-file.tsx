import { buttonClass } from "./button.tsx";

interface PickFileProps {
  label: string;
  /** What the device offers, as an input's accept. It decides nothing. */
  accept: string;
  /** Opens a phone's camera. */
  camera?: boolean;
  disabled: boolean;
  onPick: (file: File) => void;
}

/** A file input that looks like a button; the input stays in reach of the keyboard. */
export function PickFile({ label, accept, camera, disabled, onPick }: PickFileProps) {
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
        accept={accept}
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
