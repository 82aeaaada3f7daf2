import { keepPreviousData, queryOptions } from "@tanstack/react-query";
import { href } from "react-router";
import { z } from "zod";
import { type PicturePoint, picturePoint } from "./read-marks.ts";

const point = z.object({ xMm: z.number(), yMm: z.number() });

const field = z.object({
  widthMm: z.number(),
  thicknessMm: z.number(),
  stations: z.array(
    z.object({ position: z.number(), angleDeg: z.number(), signedDeg: z.number(), confidence: z.number() }),
  ),
  pith: point.nullable(),
  ringsPerInch: z.number().nullable(),
});

const answer = z.discriminatedUnion("ok", [
  z.object({
    ok: z.literal(true),
    corners: z.array(picturePoint),
    field,
    ringLines: z.array(z.array(picturePoint)),
    confidence: z.number(),
    sure: z.boolean(),
    doubts: z.array(z.string()),
    methodVersion: z.string(),
  }),
  z.object({ ok: z.literal(false), message: z.string(), corners: z.array(picturePoint).nullable() }),
]);

export type PhotoReading = z.infer<typeof answer>;

/** What the reader sees on a photo: by itself at first, then within the corners a person dragged. The last answer stays until the next is there. */
export function photoReadingQuery(photoId: string, corners: PicturePoint[] | null) {
  const rounded = corners?.map(({ x, y }) => ({ x: Math.round(x), y: Math.round(y) }));
  return queryOptions({
    queryKey: ["photos", photoId, "rings", rounded ?? "by itself"],
    staleTime: Number.POSITIVE_INFINITY,
    retry: 1,
    placeholderData: keepPreviousData,
    queryFn: async ({ signal }) => {
      const response = await fetch(href("/api/photos/:photoId/rings", { photoId }), {
        method: "POST",
        signal,
        headers: { "Content-Type": "application/json" },
        body: JSON.stringify(rounded ? { corners: rounded } : {}),
      });
      if (!response.ok) throw new Error(`answer ${response.status}`);
      return answer.parse(await response.json());
    },
  });
}
