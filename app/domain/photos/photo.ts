/** What a photo shows of a board. Ends are photographed square on, for reading the rings. */
export const photoKinds = ["near end", "far end", "heart face", "bark face", "edge"] as const;
export type PhotoKind = (typeof photoKinds)[number];

/** Sizes a photo is served in: the longest side in pixels. The original keeps its own. */
export const photoSizes = { small: 400, screen: 1600 } as const;
export type PhotoSize = keyof typeof photoSizes | "original";

export const mostPhotoBytes = 25 * 1024 * 1024;
export const mostPhotoPixels = 60_000_000;
/** No camera makes a longer side, and a strip one pixel wide and 59 million long takes twenty seconds to scale down. */
export const mostPhotoSidePx = 30_000;

export interface Photo {
  id: string;
  kind: PhotoKind;
  widthPx: number;
  heightPx: number;
  /** Drawn by a program for the demo shop, not photographed. */
  generated: boolean;
  addedBy: string;
  addedAt: Date;
}

/** Why a picture was not taken in, in words for the person who sent it. */
export type PhotoRefusal = "not arrived" | "too large" | "wrong type" | "too many pixels" | "broken";

const words: Record<PhotoRefusal, string> = {
  "not arrived": "The picture did not arrive. Send it again.",
  "too large": "That file is over 25 MB. Take the photo at a smaller size, or save it as JPEG.",
  "wrong type":
    "That is not a JPEG, PNG, WebP or AVIF picture. iPhones: choose “Most compatible” under Camera, Formats.",
  "too many pixels": "That picture is over 60 megapixels, or 30,000 pixels long. Take it at a smaller size.",
  broken: "The file is cut short or damaged. Take the photo again.",
};

/** What to tell somebody whose picture was refused. */
export function refusalWords(refusal: PhotoRefusal): string {
  return words[refusal];
}
