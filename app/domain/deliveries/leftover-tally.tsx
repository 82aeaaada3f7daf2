import { useEffect, useState } from "react";
import { Button } from "#app/components/button.tsx";
import { TextArea } from "#app/components/field.tsx";
import { Notice } from "#app/components/notice.tsx";
import { isEmptyTally } from "./tally-draft.ts";
import { forgetOnDevice, readOnDevice } from "./tally-on-device.ts";
import { printTallyText } from "./tally-text.ts";

/** On a tallied delivery: forgets what this device held of the tally, unless it holds rows that never reached the shop. Those it shows. */
export function LeftoverTally({ deliveryId }: { deliveryId: string }) {
  const [lines, setLines] = useState("");
  useEffect(() => {
    const held = readOnDevice(deliveryId);
    if (held?.unsent && !isEmptyTally(held.rows)) setLines(printTallyText(held.rows, { quarters: "", species: "" }));
    else forgetOnDevice(deliveryId);
  }, [deliveryId]);
  if (lines === "") return null;
  return (
    <Notice kind="caution" title="This device holds rows that are not in the tally" className="mb-4">
      <p className="mb-2">
        They were typed here without a connection, and the tally was saved meanwhile from elsewhere. Compare them with
        the boards below.
      </p>
      <TextArea label="Typed on this device" readOnly rows={6} value={lines} />
      <Button
        type="button"
        className="mt-3"
        onClick={() => {
          forgetOnDevice(deliveryId);
          setLines("");
        }}
      >
        Forget them
      </Button>
    </Notice>
  );
}
