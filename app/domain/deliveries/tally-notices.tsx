import { href, Link } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Notice } from "#app/components/notice.tsx";
import { When } from "#app/components/when.tsx";
import { isBlank } from "./tally.ts";
import type { KeptDraft } from "./tally-draft.ts";
import type { KeeperState } from "./tally-keeper.ts";

interface TallyNoticesProps {
  deliveryId: string;
  state: KeeperState;
  /** Rows with something in them on this device. */
  ownRows: number;
  keepMine: () => void;
  takeTheirs: () => void;
}

/** What somebody typing a tally has to know of its keeping: no connection, or another device at the same delivery. */
export function TallyNotices({ deliveryId, state, ownRows, keepMine, takeTheirs }: TallyNoticesProps) {
  switch (state.at) {
    case "offline":
      return (
        <Notice kind="caution" title="No connection" className="mb-4">
          Type on: the tally is kept on this device, through a reload too, and goes to the shop as soon as there is a
          connection. Saving waits for it.
        </Notice>
      );
    case "refused":
      return (
        <Notice kind="wrong" title="The shop does not take the tally from here" className="mb-4">
          You may have been signed out, or the delivery was deleted. What you typed is kept on this device.{" "}
          <Link to={href("/deliveries/:deliveryId", { deliveryId })} reloadDocument className="text-link underline">
            Open the delivery again
          </Link>
        </Notice>
      );
    case "tallied":
      return (
        <Notice kind="wrong" title="Somebody saved this tally meanwhile" className="mb-4">
          <Link to={href("/deliveries/:deliveryId", { deliveryId })} className="text-link underline">
            See the delivery and its boards
          </Link>
          . What you typed here is kept on this device until you have looked.
        </Notice>
      );
    case "newer elsewhere":
      return <NewerElsewhere theirs={state.theirs} {...{ ownRows, keepMine, takeTheirs }} />;
    default:
      return null;
  }
}

interface NewerElsewhereProps extends Pick<TallyNoticesProps, "ownRows" | "keepMine" | "takeTheirs"> {
  theirs: KeptDraft;
}

function NewerElsewhere({ theirs, ownRows, keepMine, takeTheirs }: NewerElsewhereProps) {
  const theirRows = theirs.rows.filter((row) => !isBlank(row)).length;
  const rows = (count: number) => `${count} ${count === 1 ? "row" : "rows"}`;
  return (
    <Notice kind="wrong" title="This delivery is being tallied on another device" className="mb-4">
      <p>
        {theirs.byName || "Somebody"} kept {rows(theirRows)} there
        {theirs.at ? <> on {<When at={new Date(theirs.at)} />}</> : null}; here are {rows(ownRows)}. One of the two goes
        on. Nothing is sent until you choose.
      </p>
      <div className="mt-2 flex flex-wrap gap-3">
        <Button type="button" onClick={takeTheirs}>
          Go on with the {rows(theirRows)} from there
        </Button>
        <Button type="button" onClick={keepMine}>
          Keep the {rows(ownRows)} here
        </Button>
      </div>
    </Notice>
  );
}
