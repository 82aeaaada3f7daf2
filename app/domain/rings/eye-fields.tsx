import { boardEnds } from "./reading.ts";

interface EyeFieldsProps {
  angleDeg: number;
  falls: "right" | "left";
  onAngle: (angleDeg: number) => void;
  onFalls: (falls: "right" | "left") => void;
}

const choice =
  "inline-flex min-h-11 cursor-pointer items-center gap-2 rounded-lg border border-line-strong px-4 has-checked:border-2 has-checked:border-action has-checked:bg-sunk";

/** The angle, which way the rings lean, and which end it is. */
export function EyeFields({ angleDeg, falls, onAngle, onFalls }: EyeFieldsProps) {
  return (
    <>
      <label className="grid gap-1 font-semibold text-sm">
        Angle between the rings and the wide face
        <input
          type="range"
          name="angleDeg"
          min={0}
          max={90}
          step={1}
          value={angleDeg}
          onChange={(event) => onAngle(Number(event.target.value))}
          aria-valuetext={`${angleDeg} degrees`}
          className="h-11 w-full accent-action"
        />
        <span className="flex justify-between font-normal text-ink-soft">
          <span>0°, flat</span>
          <span>45°</span>
          <span>90°, quartered</span>
        </span>
      </label>
      <fieldset>
        <legend className="mb-1 font-semibold text-sm">Followed to the right, a ring</legend>
        <div className="flex flex-wrap gap-2">
          {(["right", "left"] as const).map((way) => (
            <label key={way} className={choice}>
              <input
                type="radio"
                name="falls"
                value={way}
                checked={falls === way}
                onChange={() => onFalls(way)}
                className="size-5 accent-action"
              />
              {way === "right" ? "falls" : "rises"}
            </label>
          ))}
        </div>
      </fieldset>
      <fieldset>
        <legend className="mb-1 font-semibold text-sm">Which end</legend>
        <div className="flex flex-wrap gap-2">
          {boardEnds.map((end) => (
            <label key={end} className={choice}>
              <input
                type="radio"
                name="boardEnd"
                value={end}
                defaultChecked={end === "near"}
                className="size-5 accent-action"
              />
              {end} end
            </label>
          ))}
        </div>
      </fieldset>
    </>
  );
}
