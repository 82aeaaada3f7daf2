import { useEffect, useRef, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { Notice } from "#app/components/notice.tsx";

type Eye = "closed" | "open" | "refused";

const lookEveryMs = 150;
/** Frames are read at this width: enough for a code that fills a fifth of the picture, and quick on an old phone. */
const readWidthPx = 640;

/**
 * A camera that reads QR codes. It starts when asked, so nobody is surprised by the browser's question, and the pictures never leave the phone.
 *
 * @param onRead gets each code's text; true ends the reading.
 */
export function TagReader({ onRead }: { onRead: (text: string) => boolean }) {
  const [eye, setEye] = useState<Eye>("closed");
  const [stranger, setStranger] = useState(false);
  const video = useRef<HTMLVideoElement>(null);
  const read = useRef(onRead);
  read.current = onRead;

  useEffect(() => {
    if (eye !== "open") return;
    let stream: MediaStream | undefined;
    let timer: ReturnType<typeof setTimeout> | undefined;
    let ended = false;
    const canvas = document.createElement("canvas");
    async function begin() {
      // Only a page that scans carries the reader.
      const { default: jsQR } = await import("jsqr");
      stream = await navigator.mediaDevices.getUserMedia({ video: { facingMode: "environment" } });
      if (ended || !video.current) {
        for (const track of stream.getTracks()) track.stop();
        return;
      }
      video.current.srcObject = stream;
      await video.current.play();
      look(jsQR);
    }
    function look(jsQR: typeof import("jsqr").default) {
      const frame = video.current;
      const pen = canvas.getContext("2d", { willReadFrequently: true });
      if (ended || !frame || !pen) return;
      if (frame.videoWidth > 0) {
        canvas.width = readWidthPx;
        canvas.height = Math.round((readWidthPx * frame.videoHeight) / frame.videoWidth);
        pen.drawImage(frame, 0, 0, canvas.width, canvas.height);
        const code = jsQR(pen.getImageData(0, 0, canvas.width, canvas.height).data, canvas.width, canvas.height);
        if (code?.data) {
          if (read.current(code.data)) return;
          setStranger(true);
        }
      }
      timer = setTimeout(() => look(jsQR), lookEveryMs);
    }
    begin().catch(() => setEye("refused"));
    return () => {
      ended = true;
      clearTimeout(timer);
      for (const track of stream?.getTracks() ?? []) track.stop();
    };
  }, [eye]);

  if (eye === "closed")
    return (
      <Button type="button" look="main" className="min-h-14 w-full text-lg" onClick={() => setEye("open")}>
        Start the camera
      </Button>
    );
  if (eye === "refused")
    return (
      <Notice kind="caution" title="No camera">
        This browser has none, or was told not to lend it. The phone's own camera app reads tags too; or type the number
        below.
      </Notice>
    );
  return (
    <div className="grid gap-3">
      <video
        ref={video}
        muted
        playsInline
        className="aspect-square w-full rounded-xl bg-iron-900 object-cover"
        aria-label="What the camera sees"
      />
      {stranger ? (
        <Notice kind="caution" title="That code is not a board's tag." />
      ) : (
        <p className="text-ink-soft">Looking for a code</p>
      )}
    </div>
  );
}
