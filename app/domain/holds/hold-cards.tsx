import { Form, href, Link } from "react-router";
import { Button } from "#app/components/button.tsx";
import { crayonInk, ProjectMark } from "#app/components/crayon.tsx";
import { printDay } from "#app/components/when.tsx";
import type { BoardSummary, HoldMark } from "#app/domain/boards/board.ts";
import { BoardLength } from "#app/domain/boards/board-length.tsx";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { can, type Role } from "#app/domain/shop/permissions.ts";

interface HoldCardsProps {
  board: BoardSummary;
  role: Role;
  personId: string;
}

/** Who has spoken for what of this board, on a drawing of its length and in words, with what may be done about it. */
export function HoldCards({ board, role, personId }: HoldCardsProps) {
  return (
    <div className="grid gap-4">
      <BoardLength board={board} />
      {board.holds.length === 0 ? <p className="text-ink-soft">Nobody has spoken for it.</p> : null}
      {board.holds.map((hold) => (
        <div
          key={hold.holdId}
          className="rounded-lg border-l-8 bg-sunk p-3"
          style={{ borderColor: crayonInk[hold.crayon] }}
        >
          <p>
            <strong>
              <LengthText mm={hold.toMm - hold.fromMm} /> {hold.state === "out" ? "taken down" : "reserved"}
            </strong>{" "}
            for{" "}
            <Link to={href("/projects/:projectId", { projectId: hold.projectId })} className="text-ink underline">
              <ProjectMark name={hold.projectName} crayon={hold.crayon} />
            </Link>
          </p>
          <p className="text-ink-soft">
            <LengthText mm={hold.fromMm} unit={false} /> to <LengthText mm={hold.toMm} /> from the near end.{" "}
            {hold.placedBy}, until {printDay(hold.expiresAt)}.
          </p>
          {mayChange(hold, role, personId) ? (
            <Form
              method="post"
              action={href("/holds/:holdId", { holdId: hold.holdId })}
              className="mt-2 flex flex-wrap gap-2"
            >
              <Button name="intent" value="extend">
                Extend two weeks
              </Button>
              <Button name="intent" value="let go">
                Let go
              </Button>
            </Form>
          ) : null}
        </div>
      ))}
    </div>
  );
}

function mayChange(hold: HoldMark, role: Role, personId: string): boolean {
  return can(role, "hold:change-any") || (can(role, "hold:change-own") && hold.placedById === personId);
}
