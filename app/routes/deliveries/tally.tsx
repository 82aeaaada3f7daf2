import { data, href, Link, redirect } from "react-router";
import { PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { printDay, When } from "#app/components/when.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { getDelivery } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { printVolume } from "#app/domain/deliveries/delivery-cost.ts";
import { readTally } from "#app/domain/deliveries/read-tally.ts";
import { saveTally } from "#app/domain/deliveries/tally.server.ts";
import { mostBoardsAtOnce } from "#app/domain/deliveries/tally.ts";
import { readTallyDraft } from "#app/domain/deliveries/tally-draft.server.ts";
import { tallyRows } from "#app/domain/deliveries/tally-draft.ts";
import { TallyForm } from "#app/domain/deliveries/tally-form.tsx";
import { TallyHelp } from "#app/domain/deliveries/tally-help.tsx";
import { TallyLinesForm } from "#app/domain/deliveries/tally-lines-form.tsx";
import { TallyProblems } from "#app/domain/deliveries/tally-problems.tsx";
import { type NumberedRow, printTallyText, readTallyText } from "#app/domain/deliveries/tally-text.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/tally.ts";

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "delivery:tally");
  const db = context.get(dbContext);
  const delivery = requireFound(await getDelivery(db, actor, params.deliveryId));
  // Boards that were missed are added to a tallied delivery only by somebody who asked for that.
  if (delivery.talliedAt && !url.searchParams.has("more"))
    throw redirect(href("/deliveries/:deliveryId", { deliveryId: delivery.id }));
  const { draft } = requireFound(await readTallyDraft(db, actor, delivery.id));
  return { delivery, draft };
}

/** Saves the tally: rows of the grid, or lines of text. Both are read here again, whatever the page made of them. */
export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "delivery:tally");
  const db = context.get(dbContext);
  const delivery = requireFound(await getDelivery(db, actor, params.deliveryId));
  const carried = { quarters: String(delivery.quarters), species: delivery.species };
  const form = await request.formData();
  const after = momentOf(form.get("after"));
  const text = String(form.get("lines") ?? "").slice(0, 100_000);
  const rows = form.has("lines") ? readTallyText(text, carried) : gridRows(form.get("rows"));
  if (!rows) return data({ problems: [], lines: text, refused: { why: "wrong shape" as const } }, { status: 400 });
  const read = readTally(rows, shop.units);
  if (!read.ok) return data({ problems: read.problems, lines: text, refused: null }, { status: 400 });
  const saved = await saveTally(db, actor, delivery.id, read.lines, systemClock.now(), after);
  if (saved.ok) return redirect(`${href("/deliveries/:deliveryId", { deliveryId: delivery.id })}?tallied`);
  if (saved.why === "missing") notHere();
  const status = saved.why === "tallied" ? 409 : 400;
  return data({ problems: [], lines: text, refused: saved }, { status });
}

/** Which tally the form was made after, or null for the first. A moment that is none fits no tally. */
function momentOf(posted: FormDataEntryValue | null): Date | null {
  return posted ? new Date(String(posted)) : null;
}

/** The grid's rows as posted, numbered as they stood; null when that is no grid. */
function gridRows(posted: FormDataEntryValue | null): NumberedRow[] | null {
  try {
    const parsed = tallyRows.safeParse(JSON.parse(String(posted)));
    return parsed.success ? parsed.data.map((row, index) => ({ lineNumber: index + 1, row })) : null;
  } catch {
    return null;
  }
}

export default function TallyPage({ loaderData, actionData }: Route.ComponentProps) {
  const { delivery, draft } = loaderData;
  const { units } = useShop();
  const carried = { quarters: String(delivery.quarters), species: delivery.species };
  const claimed =
    delivery.claimedVolume === null || delivery.talliedAt
      ? null
      : `${printVolume(delivery.claimedVolume, delivery.claimedUnit)} claimed`;
  return (
    <>
      <PageHead
        title={delivery.talliedAt ? "Add boards" : "Tally"}
        over={[delivery.supplierName, printDay(delivery.receivedOn), delivery.reference].filter(Boolean).join(" · ")}
        lead={[`${printQuarters(delivery.quarters)} ${speciesName(delivery.species)}`, claimed]
          .filter(Boolean)
          .join(", ")}
      />
      <TallyProblems problems={actionData?.problems ?? []} />
      {actionData?.refused ? <Refused deliveryId={delivery.id} refused={actionData.refused} /> : null}
      <div className="noscript:hidden">
        <TallyHelp unit={units} />
        <TallyForm key={delivery.talliedAt?.getTime()} delivery={delivery} draft={draft} />
      </div>
      <noscript>
        <TallyLinesForm
          talliedAt={delivery.talliedAt}
          lines={actionData?.lines || printTallyText(draft.rows, carried)}
        />
      </noscript>
    </>
  );
}

type Refusal = { why: "wrong shape" | "empty" | "too many" | "missing" } | { why: "tallied"; at: Date };

function Refused({ deliveryId, refused }: { deliveryId: string; refused: Refusal }) {
  if (refused.why === "tallied")
    return (
      <Notice kind="wrong" title="This delivery is tallied already" className="mb-4">
        Its boards were made on <When at={refused.at} />.{" "}
        <Link to={href("/deliveries/:deliveryId", { deliveryId })} className="text-link underline">
          See them
        </Link>
      </Notice>
    );
  const words =
    refused.why === "empty"
      ? "There is no board in it yet."
      : refused.why === "too many"
        ? `More than ${mostBoardsAtOnce.toLocaleString("en")} boards: check the counts.`
        : "The rows did not arrive whole. Save again.";
  return <Notice kind="wrong" title={words} className="mb-4" />;
}
