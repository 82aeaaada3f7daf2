import { useEffect, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { TextArea } from "#app/components/field.tsx";
import { Notice } from "#app/components/notice.tsx";
import { forgetLeft, leftOnDevice } from "./tally-on-device.ts";
import { printTallyText } from "./tally-text.ts";

interface LeftoverTallyProps {
  deliveryId: string;
  /** ISO moment of the last tally. */
  talliedAt: string;
}

/** On a tallied delivery: forgets what this device held of the tally, unless it holds rows that never reached the shop. Those it shows. */
export function LeftoverTally({ deliveryId, talliedAt }: LeftoverTallyProps) {
  const [lines, setLines] = useState("");
  useEffect(() => {
    const rows = leftOnDevice({ deliveryId, after: talliedAt });
    setLines(printTallyText(rows, { quarters: "", species: "" }));
  }, [deliveryId, talliedAt]);
  if (lines === "") return null;
  return (
    <Notice kind="caution" title="This device holds rows that are not in the tally" className="mb-4">
      <p className="mb-2">
        They were typed here without a connection, and the tally was saved meanwhile from elsewhere. Compare them with
        the boards below; what is missing there can be added.
      </p>
      <TextArea label="Typed on this device" readOnly rows={6} value={lines} />
      <Button
        type="button"
        className="mt-3"
        onClick={() => {
          forgetLeft({ deliveryId, after: talliedAt });
          setLines("");
        }}
      >
        Forget them
      </Button>
    </Notice>
  );
}
