import { href, Link } from "react-router";
import { Notice } from "#app/components/notice.tsx";
import { printDay } from "#app/components/when.tsx";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { BoardSize, LengthText } from "#app/domain/boards/size-text.tsx";
import type { HoldRefusal } from "./hold.ts";

/** Why a board could not be reserved: who has it, until when, what of it is free, and which boards would do as well. */
export function HoldRefused({ refusal }: { refusal: HoldRefusal }) {
  if (refusal.why === "missing")
    return <Notice kind="wrong" title="That project or board is not in this shop any more." />;
  if (refusal.why === "not racked")
    return <Notice kind="wrong" title={`This board is ${refusal.state}, not on the rack.`} />;
  if (refusal.why === "length")
    return (
      <Notice kind="wrong" title="That is more than there is.">
        The board is <LengthText mm={refusal.lengthMm} /> long.
      </Notice>
    );
  return (
    <Notice kind="wrong" title="That length is spoken for">
      <ul className="mt-1 grid gap-1">
        {refusal.by.map((hold) => (
          <li key={hold.holdId}>
            <strong>{hold.placedBy}</strong> has <LengthText mm={hold.fromMm} unit={false} /> to{" "}
            <LengthText mm={hold.toMm} /> from the near end for <strong>{hold.projectName}</strong>, until{" "}
            {printDay(hold.expiresAt)}.
          </li>
        ))}
      </ul>
      <p className="mt-2">
        {refusal.free.length === 0 ? (
          "Nothing of this board is free."
        ) : (
          <>
            Still free:{" "}
            {refusal.free.map((stretch, index) => (
              <span key={stretch.fromMm}>
                {index > 0 ? ", " : ""}
                <LengthText mm={stretch.fromMm} unit={false} /> to <LengthText mm={stretch.toMm} />
              </span>
            ))}
            .
          </>
        )}
      </p>
      {refusal.others.length > 0 ? (
        <div className="mt-3">
          <p className="font-semibold">Would do as well</p>
          <ul className="mt-1 grid gap-2">
            {refusal.others.map((board) => (
              <li key={board.id}>
                <Link
                  to={href("/boards/:boardId", { boardId: board.id })}
                  className="flex min-h-11 flex-wrap items-center gap-3 text-ink"
                >
                  <BoardEnd board={board} heightPx={20} />
                  <span className="font-semibold">{board.tag}</span> <BoardSize board={board} />
                  <span className="text-ink-soft">{board.place}</span>
                </Link>
              </li>
            ))}
          </ul>
        </div>
      ) : null}
    </Notice>
  );
}
