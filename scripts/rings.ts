import { existsSync } from "node:fs";
import { type EndCorners, wholePicture } from "#app/core/endgrain/corner-check.ts";
import { findCorners } from "#app/core/endgrain/find-corners.ts";
import { readEnd } from "#app/core/endgrain/read-end.ts";
import { decodePhoto } from "#app/services/decode-photo.server.ts";
import { parseRingsCommand, type RingsCommand } from "#scripts/endgrain/rings-command.ts";

/** Reads the rings of each image named and prints one JSON object a line; leaves with 1 when any could not be read. */
async function main(): Promise<void> {
  const command = parseRingsCommand(process.argv.slice(2));
  if ("error" in command) {
    console.log(JSON.stringify({ error: command.error }));
    process.exitCode = 1;
    return;
  }
  for (const image of command.images) {
    const answer = await readImage(image, command);
    if ("error" in answer) process.exitCode = 1;
    console.log(JSON.stringify(answer));
  }
}

async function readImage(image: string, command: RingsCommand): Promise<Record<string, unknown>> {
  const started = performance.now();
  if (!existsSync(image)) return { image, error: "There is no such file." };
  const photo = await decodePhoto(image, command.corners).catch(() => null);
  if (!photo) return { image, error: "The file is no picture that can be read." };
  const { scaleX, scaleY } = photo;
  const given = command.corners?.map((p) => ({ x: p.x * scaleX, y: p.y * scaleY })) as EndCorners | undefined;
  const proposed = given ? null : findCorners(photo.pixels);
  if (proposed?.found === "unclear") {
    return {
      image,
      error: "The board's end does not fill the picture and its corners could not be found: give them with --corners.",
      problem: "corners-unclear",
    };
  }
  const { widthMm, thicknessMm } = command;
  const reading = readEnd(photo.pixels, { corners: given ?? proposed!.corners, widthMm, thicknessMm });
  if (!reading.ok) return { image, error: reading.message, problem: reading.problem };
  const own =
    command.corners ??
    (proposed!.found === "whole"
      ? wholePicture(photo)
      : reading.corners.map((p) => ({ x: p.x / scaleX, y: p.y / scaleY })));
  const lengthX = widthMm ? 1 : 1 / scaleX;
  const lengthY = thicknessMm ? 1 : 1 / scaleY;
  return {
    image,
    corners: own.map((p) => [tidy(p.x, 1), tidy(p.y, 1)]),
    stations: reading.stations.map((s) => ({
      position: tidy(s.position, 4),
      angle: tidy(s.angleDeg, 2),
      signed: tidy(s.signedDeg, 2),
      confidence: tidy(s.confidence, 3),
    })),
    angle: tidy(reading.angleDeg, 2),
    shares: {
      flat: tidy(reading.shares.flat, 4),
      rift: tidy(reading.shares.rift, 4),
      quartered: tidy(reading.shares.quartered, 4),
    },
    class: reading.class,
    pith: reading.pith && { x: tidy(reading.pith.xMm * lengthX, 2), y: tidy(reading.pith.yMm * lengthY, 2) },
    ringsPerInch: reading.ringsPerInch === null ? null : tidy(reading.ringsPerInch, 2),
    confidence: tidy(reading.confidence, 3),
    sure: reading.sure,
    doubts: reading.doubts,
    method: reading.methodVersion,
    ms: Math.round(performance.now() - started),
  };
}

function tidy(value: number, digits: number): number {
  return Number(value.toFixed(digits));
}

await main();
