import { useQuery } from "@tanstack/react-query";
import { useEffect, useMemo, useState } from "react";
import type { RingField } from "#app/core/rings/ring-types.ts";
import { type PicturePoint, placeOnPhoto, type RingMarks, readMarks } from "./read-marks.ts";
import { photoReadingQuery } from "./rings.queries.ts";

/** What the page shows of an end at this moment, whoever says it: strokes before a moved pith before the reader. */
export interface ShownReading {
  field: RingField;
  confidence: number;
  doubts: string[];
  from: "strokes" | "pith" | "photo";
  sure: boolean;
}

interface Photo {
  photoId: string;
  board: { widthMm: number; thicknessMm: number };
  start: RingMarks;
}

/** Below this the marks are not called sure. */
const sureFrom = 0.6;

/** How long a corner rests before the reader is asked again: an answer takes about as long as a glance. */
const restMs = 120;

/** The marks on a photo, and what they and the reader say of the end. */
export function useRingMarks({ photoId, board, start }: Photo) {
  const [marks, setMarks] = useState(start);
  const [touched, setTouched] = useState(false);
  const resting = useResting(marks.corners, restMs);
  const { data, isFetching, isError } = useQuery(photoReadingQuery(photoId, touched ? resting : null));

  // The reader's own corners stand until a person moves one.
  useEffect(() => {
    if (touched || !data?.corners) return;
    const { corners } = data;
    setMarks((old) => ({ ...old, corners }));
  }, [touched, data]);

  const photo = data?.ok ? data : null;
  const byHand = useMemo(() => readMarks(marks, board, photo?.field.ringsPerInch ?? null), [marks, board, photo]);
  const shown = useMemo((): ShownReading | null => {
    if (byHand) return byHand.ok ? { ...byHand, sure: byHand.confidence >= sureFrom } : null;
    return (
      photo && {
        field: photo.field,
        confidence: photo.confidence,
        doubts: photo.doubts,
        from: "photo",
        sure: photo.sure,
      }
    );
  }, [byHand, photo]);
  const trouble =
    byHand && !byHand.ok
      ? byHand.why
      : data && !data.ok
        ? data.message
        : isError
          ? "The reader did not answer. Mark the rings by hand."
          : null;
  const pith = shown?.field.pith ? placeOnPhoto(marks, board, shown.field.pith) : null;

  return {
    marks,
    shown,
    trouble,
    reading: isFetching,
    /** Ring lines to draw over the photo while the reader's word stands. */
    ringLines: byHand ? [] : (photo?.ringLines ?? []),
    pith: marks.pith ?? pith,
    moveCorner(index: number, to: PicturePoint) {
      setTouched(true);
      setMarks((old) => ({ ...old, corners: old.corners.map((corner, i) => (i === index ? to : corner)) }));
    },
    movePith: (to: PicturePoint) => setMarks((old) => ({ ...old, pith: to })),
    addStroke: (stroke: PicturePoint[]) => setMarks((old) => ({ ...old, strokes: [...old.strokes, stroke] })),
    undoStroke: () => setMarks((old) => ({ ...old, strokes: old.strokes.slice(0, -1) })),
    startOver() {
      setTouched(false);
      setMarks({ ...start, corners: data?.corners && !touched ? data.corners : start.corners });
    },
  };
}

/** The value once it has stood still for a moment. */
function useResting<T>(value: T, ms: number): T {
  const [resting, setResting] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setResting(value), ms);
    return () => clearTimeout(timer);
  }, [value, ms]);
  return resting;
}
