import { href, Link } from "react-router";
import { Card } from "#app/components/card.tsx";
import { Facts } from "#app/components/facts.tsx";
import { toPanel } from "#app/components/panel.tsx";
import { printDay } from "#app/components/when.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { printMoney } from "#app/domain/shop/money.ts";
import { can, type Role } from "#app/domain/shop/permissions.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { type Board, figureStrengths } from "./board.ts";
import type { CorrectionGroup } from "./board-correction.schema.ts";
import { LengthText } from "./size-text.tsx";

/** The record beside the board, in groups; each can be corrected where it stands. */
export function BoardFacts({ board, role }: { board: Board; role: Role }) {
  const { currency } = useShop();
  const correct = can(role, "board:correct");
  const group = (title: string, name: CorrectionGroup, rows: { label: string; value: React.ReactNode }[]) => (
    <Card title={title} aside={correct ? <CorrectLink board={board} group={name} title={title} /> : null}>
      <Facts rows={rows} />
    </Card>
  );
  return (
    <>
      {group("Wood", "wood", [
        { label: "Species", value: speciesName(board.species) },
        { label: "Quarters", value: printQuarters(board.quarters) },
        { label: "Grade, as bought", value: board.grade || "not recorded" },
        { label: "Edges", value: board.edges },
        { label: "Surface", value: board.surface },
      ])}
      {group("Size", "size", [
        { label: "Thickness, measured", value: <LengthText mm={board.thicknessMm} /> },
        { label: "Width", value: <WidthText board={board} /> },
        { label: "Length", value: <LengthText mm={board.lengthMm} /> },
      ])}
      {group("Figure and colour", "figure", [
        {
          label: "Figure",
          value: board.figureKind ? `${figureStrengths[board.figureStrength]} ${board.figureKind}` : "none noted",
        },
        { label: "Where", value: board.figureWhere || "–" },
        { label: "Sapwood", value: board.sapSharePct === null ? "not recorded" : `${board.sapSharePct} %` },
        { label: "Colour", value: board.colourNote || "–" },
      ])}
      {group("Log", "log", [
        { label: "Log", value: board.logName || "not known" },
        { label: "Place in its sequence", value: board.logSequence ?? "–" },
      ])}
      {can(role, "cost:see")
        ? group("Cost", "cost", [
            { label: "Cost", value: board.costMinor === null ? "not known" : printMoney(board.costMinor, currency) },
            { label: "From", value: <Origin board={board} /> },
          ])
        : null}
      {group("Notes", "notes", [{ label: board.notes || "None.", value: "" }])}
    </>
  );
}

function WidthText({ board }: { board: Board }) {
  if (board.widthFarMm === null) return <LengthText mm={board.widthMm} />;
  return (
    <>
      <LengthText mm={board.widthMm} unit={false} /> near, <LengthText mm={board.widthFarMm} /> far
    </>
  );
}

function Origin({ board }: { board: Board }) {
  if (board.parent)
    return (
      <Link to={href("/boards/:boardId", { boardId: board.parent.id })} className="text-link underline">
        offcut of {board.parent.tag}
      </Link>
    );
  if (!board.delivery || !board.deliveryId) return "not recorded";
  return (
    <Link to={href("/deliveries/:deliveryId", { deliveryId: board.deliveryId })} className="text-link underline">
      {board.delivery.supplierName}, {printDay(board.delivery.receivedOn)}
    </Link>
  );
}

function CorrectLink({ board, group, title }: { board: Board; group: CorrectionGroup; title: string }) {
  return (
    <Link
      to={href("/boards/:boardId/correct/:group", { boardId: board.id, group }) + toPanel}
      className="inline-flex min-h-11 items-center text-link underline-offset-4 hover:underline"
      aria-label={`Correct ${title.toLowerCase()}`}
    >
      Correct
    </Link>
  );
}
