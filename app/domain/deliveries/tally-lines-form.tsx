import { Button } from "#app/components/button.tsx";
import { TextArea } from "#app/components/field.tsx";

/** The same tally as lines of text, for a browser that runs no scripts. */
export function TallyLinesForm({ lines, talliedAt }: { lines: string; talliedAt: Date | null }) {
  return (
    <form method="post" className="grid gap-4">
      <input type="hidden" name="after" value={talliedAt?.toISOString() ?? ""} />
      <TextArea
        label="Boards, one size a line"
        name="lines"
        rows={16}
        defaultValue={lines}
        spellCheck={false}
        hint={`8 1/4 x 10'6" for one board, 3 @ 8 x 10' for three alike. Other quarters or species follow a comma and hold for the lines below: 7 x 9', 5/4, black cherry.`}
      />
      <Button look="main" className="w-full sm:w-auto sm:justify-self-start">
        Save the tally
      </Button>
    </form>
  );
}
