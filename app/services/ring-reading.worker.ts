import { parentPort } from "node:worker_threads";
import type { EndCorners } from "#app/core/endgrain/corner-check.ts";
import { findCorners } from "#app/core/endgrain/find-corners.ts";
import { readEnd } from "#app/core/endgrain/read-end.ts";
import { decodePhoto } from "./decode-photo.server.ts";
import type { RingAnswer, RingQuestion } from "./ring-reader.server.ts";

/** Reads rings beside the web process, which answers other people meanwhile. One question after another. */
parentPort?.on("message", async ({ id, question }: { id: number; question: RingQuestion }) => {
  const answer = await read(question).catch(
    (error: unknown): RingAnswer => ({
      ok: false,
      message: `The photo cannot be read: ${String(error)}`,
      corners: null,
    }),
  );
  parentPort?.postMessage({ id, answer });
});

async function read({ bytes, corners: given, ...options }: RingQuestion): Promise<RingAnswer> {
  const photo = await decodePhoto(Buffer.from(bytes), given);
  const { scaleX, scaleY } = photo;
  const scaled = given?.map(({ x, y }) => ({ x: x * scaleX, y: y * scaleY })) as EndCorners | undefined;
  const proposed = scaled ? null : findCorners(photo.pixels);
  const own = ({ x, y }: { x: number; y: number }) => ({ x: x / scaleX, y: y / scaleY });
  if (proposed?.found === "unclear")
    return {
      ok: false,
      message: "The board's end could not be found in the photo: drag the corners onto it.",
      corners: proposed.corners.map(own),
    };
  const reading = readEnd(photo.pixels, { ...options, corners: scaled ?? proposed?.corners });
  if (!reading.ok) return { ok: false, message: reading.message, corners: proposed?.corners.map(own) ?? null };
  const { widthMm, thicknessMm, stations, pith, ringsPerInch, confidence, sure, doubts, methodVersion } = reading;
  return {
    ok: true,
    corners: reading.corners.map(own),
    field: { widthMm, thicknessMm, stations, pith, ringsPerInch },
    ringLines: reading.ringLines.map((line) => line.map(own)),
    confidence,
    sure,
    doubts,
    methodVersion,
  };
}
