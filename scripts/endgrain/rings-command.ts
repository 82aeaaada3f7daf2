import type { EndCorners } from "#app/core/endgrain/corner-check.ts";

/** What `npm run rings` was asked. Corners in the photograph's own pixels. */
export type RingsCommand = { images: string[]; corners?: EndCorners; widthMm?: number; thicknessMm?: number };

const USAGE = "Usage: npm run -s rings -- IMAGE [IMAGE…] [--corners x,y,x,y,x,y,x,y] [--width MM --thickness MM]";

/** Reads the command line; @returns what is wrong with it in words when it cannot be followed. */
export function parseRingsCommand(args: readonly string[]): RingsCommand | { error: string } {
  const command: RingsCommand = { images: [] };
  for (let i = 0; i < args.length; i++) {
    const [name, inline] = args[i]!.startsWith("--") ? split(args[i]!) : ["", undefined];
    if (!name) {
      command.images.push(args[i]!);
      continue;
    }
    const value = inline ?? args[++i];
    if (value === undefined) return { error: `${name} needs a value. ${USAGE}` };
    if (name === "--corners") {
      const numbers = value.split(",").map((part) => (part.trim() === "" ? Number.NaN : Number(part)));
      if (numbers.length !== 8 || numbers.some((n) => !Number.isFinite(n)))
        return { error: `--corners needs eight numbers, x and y of each corner in turn. ${USAGE}` };
      command.corners = [0, 2, 4, 6].map((k) => ({ x: numbers[k]!, y: numbers[k + 1]! })) as EndCorners;
    } else if (name === "--width" || name === "--thickness") {
      const mm = Number(value);
      if (!(mm > 0) || !Number.isFinite(mm))
        return { error: `${name} needs a length in millimetres, more than 0. ${USAGE}` };
      if (name === "--width") command.widthMm = mm;
      else command.thicknessMm = mm;
    } else return { error: `There is no option ${name}. ${USAGE}` };
  }
  if (command.images.length === 0) return { error: `No image was named. ${USAGE}` };
  if ((command.widthMm === undefined) !== (command.thicknessMm === undefined))
    return { error: `--width and --thickness go together. ${USAGE}` };
  return command;
}

function split(argument: string): [string, string | undefined] {
  const at = argument.indexOf("=");
  return at < 0 ? [argument, undefined] : [argument.slice(0, at), argument.slice(at + 1)];
}
