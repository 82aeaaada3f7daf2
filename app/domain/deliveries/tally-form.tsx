import { type FormEvent, useMemo, useState } from "react";
import { Form, useNavigation, useSubmit } from "react-router";
import { Card } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { differenceWords } from "./claim-card.tsx";
import type { Delivery } from "./delivery.ts";
import { checkClaim } from "./delivery-cost.ts";
import { isBlank, readRow } from "./tally.ts";
import type { KeptDraft } from "./tally-draft.ts";
import { saveButtonId, TallyFooter } from "./tally-footer.tsx";
import { TallyGrid } from "./tally-grid.tsx";
import { TallyNotices } from "./tally-notices.tsx";
import { boxId } from "./tally-row.tsx";
import { totalRows } from "./tally-totals.ts";
import { useTally } from "./use-tally.ts";

interface TallyFormProps {
  delivery: Delivery;
  draft: KeptDraft;
}

/** A tally being typed: the grid, what it comes to, and saving it once the shop has all of it. */
export function TallyForm({ delivery, draft }: TallyFormProps) {
  const { units } = useShop();
  const submit = useSubmit();
  const after = delivery.talliedAt?.toISOString() ?? null;
  const carried = { quarters: String(delivery.quarters), species: delivery.species };
  const { grid, change, isReady, state, flush, keepMine, takeTheirs } = useTally(
    { deliveryId: delivery.id, after },
    draft,
    carried,
  );
  const [isTried, setTried] = useState(false);
  const [isFlushing, setFlushing] = useState(false);
  const totals = useMemo(() => totalRows(grid.rows, units), [grid.rows, units]);
  const claim = after === null ? checkClaim(delivery, totals) : null;
  const rows = grid.rows.filter((row) => !isBlank(row));
  const isSaving = useNavigation().state !== "idle" || isFlushing;

  async function save(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    setTried(true);
    const wrong = grid.rows.find((row) => readRow(row, units).state === "wrong");
    if (wrong) return document.getElementById(boxId(wrong.key, "width"))?.focus();
    setFlushing(true);
    const { at } = await flush();
    setFlushing(false);
    if (at === "kept") await submit(form);
  }

  return (
    <>
      <TallyNotices deliveryId={delivery.id} state={state} ownRows={rows.length} {...{ keepMine, takeTheirs }} />
      {/* High enough that the footer stays where it is while messages come and go: a tap on Save must not miss it. */}
      <Form method="post" onSubmit={save} className="flex min-h-[72dvh] flex-col">
        <input type="hidden" name="after" value={after ?? ""} />
        <input type="hidden" name="rows" value={JSON.stringify(rows.map(({ key: _, ...row }) => row))} />
        <Card className="-mx-4 rounded-none border-x-0 sm:mx-0 sm:rounded-xl sm:border-x">
          <TallyGrid {...{ grid, change, totals, isReady, isTried }} unit={units} onEnd={focusSave} />
        </Card>
        {isTried && totals.unread > 0 ? (
          <Notice kind="wrong" title="Some rows cannot be read yet" className="mt-4">
            Put right what is said beside them, or delete them, and save again.
          </Notice>
        ) : null}
        <TallyFooter
          totals={totals}
          difference={claim && totals.count > 0 ? differenceWords(claim) : null}
          state={state}
          isSaving={isSaving}
          maySave={isReady && totals.count > 0}
        />
      </Form>
    </>
  );
}

function focusSave(): void {
  document.getElementById(saveButtonId)?.focus();
}
