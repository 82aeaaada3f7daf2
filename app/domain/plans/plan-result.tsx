import { Form, href, Link } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Card } from "#app/components/card.tsx";
import { Facts } from "#app/components/facts.tsx";
import { Notice } from "#app/components/notice.tsx";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { boardMeasure, printBoardFeet } from "#app/domain/boards/board-measure.ts";
import { BoardSize, LengthText } from "#app/domain/boards/size-text.tsx";
import { printMoney } from "#app/domain/shop/money.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { LayoutDrawing } from "./layout-drawing.tsx";
import type { MadePlan, PlannedBoard } from "./made-plan.ts";

/** A plan: what it costs and how far that is from the best possible, what stays unplaced and why, and each board drawn. */
export function PlanResult({ plan }: { plan: MadePlan }) {
  const { currency } = useShop();
  const placed = plan.boards.flatMap(({ layout }) => layout.pieces);
  const used = plan.boards.reduce(
    (sum, { board, stretch }) => sum + board.widthMm * (stretch.toMm - stretch.fromMm),
    0,
  );
  const cut = placed.reduce((sum, piece) => sum + piece.length * piece.width, 0);
  return (
    <div className="grid gap-4">
      {plan.unmade.length > 0 ? (
        <Notice kind="caution" title="No stock of the right species">
          Nothing on the rack makes {plan.unmade.join(", ")}: buy some, or choose another species for it.
        </Notice>
      ) : null}
      {plan.unplaced.length > 0 ? (
        <Notice kind="caution" title="Not everything finds a board">
          <ul className="list-inside list-disc">
            {plan.unplaced.map(({ part, quantity, why }) => (
              <li key={part}>
                {quantity} {quantity === 1 ? "piece" : "pieces"} of {part}: {why}
              </li>
            ))}
          </ul>
        </Notice>
      ) : null}
      {plan.boards.length > 0 ? (
        <Card
          title={`${placed.length} pieces from ${plan.boards.length} ${plan.boards.length === 1 ? "board" : "boards"}`}
        >
          <Facts
            rows={[
              { label: "Cost, offcuts counted", value: printMoney(Math.round(plan.cost), currency) },
              { label: "How good", value: gapWords(plan.gap) },
              { label: "Yield of the wood opened", value: `${Math.round((100 * cut) / Math.max(1, used))} %` },
            ]}
          />
          <Form method="post" className="mt-4">
            <input type="hidden" name="stretches" value={JSON.stringify(plan.boards.map(({ holds }) => holds))} />
            <Button look="main" className="w-full sm:w-auto">
              Accept: reserve these boards
            </Button>
          </Form>
        </Card>
      ) : null}
      {plan.boards.map((planned) => (
        <PlannedBoardCard key={`${planned.board.id} ${planned.stretch.fromMm}`} planned={planned} />
      ))}
    </div>
  );
}

function gapWords(gap: number): string {
  return gap < 0.0005 ? "the best possible" : `within ${(100 * gap).toFixed(1)} % of the best possible`;
}

function PlannedBoardCard({ planned }: { planned: PlannedBoard }) {
  const { board, stretch, layout, holds } = planned;
  return (
    <Card>
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-1">
        <BoardEnd board={board} heightPx={24} />
        <Link to={href("/boards/:boardId", { boardId: board.id })} className="font-bold font-display text-ink text-xl">
          {board.tag}
        </Link>
        <span>
          {speciesName(board.species)}, <BoardSize board={board} />
        </span>
        <span className="text-ink-soft">{board.place ?? "no place recorded"}</span>
        <span className="font-mono text-ink-soft">{printBoardFeet(boardMeasure(board))}</span>
      </div>
      <LayoutDrawing planned={planned} />
      <p className="mt-2 text-ink-soft">
        Saw lines are numbered in order; the near end is on the left
        {stretch.fromMm > 0 ? (
          <>
            , <LengthText mm={stretch.fromMm} /> along the board
          </>
        ) : null}
        . Holds <LengthText mm={holds.toMm - holds.fromMm} />.
        {layout.offcuts.length > 0
          ? ` Leaves ${layout.offcuts.length} ${layout.offcuts.length === 1 ? "offcut" : "offcuts"} worth keeping.`
          : ""}
      </p>
    </Card>
  );
}
