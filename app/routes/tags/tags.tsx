import { Form, href, useSearchParams } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { Empty } from "#app/components/notice.tsx";
import { labelSheets } from "#app/core/labels/label-sheets.ts";
import { BoardEnd } from "#app/domain/boards/board-end.tsx";
import { BoardSize } from "#app/domain/boards/size-text.tsx";
import { boardsToTag } from "#app/domain/tags/tags.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/tags.ts";

export async function loader({ context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "tag:print");
  return { boards: await boardsToTag(context.get(dbContext), actor, url.searchParams, shop), sheet: shop.labelSheet };
}

export default function Tags({ loaderData }: Route.ComponentProps) {
  const { boards, sheet } = loaderData;
  const [params] = useSearchParams();
  const carried = [...params].filter(([name]) => name !== "sheet" && name !== "skip");
  if (boards.length === 0)
    return <Empty title="No boards to tag">Choose boards on the list, or open one and print its tag.</Empty>;
  return (
    <>
      <PageHead
        title={boards.length === 1 ? `Tag of ${boards[0]?.tag}` : `${boards.length} tags`}
        lead="A PDF of exact size: print it at 100 %, never “fit to page”."
      />
      <div className="grid items-start gap-4 lg:grid-cols-[22rem_minmax(0,1fr)]">
        <Card>
          <Form method="get" action={href("/files/tags.pdf")} target="_blank" reloadDocument className="grid gap-4">
            {carried.map(([name, value]) => (
              <input key={`${name} ${value}`} type="hidden" name={name} value={value} />
            ))}
            <SelectField label="Labels" name="sheet" defaultValue={sheet} hint="By the dimensions on their box.">
              {labelSheets.map((choice) => (
                <option key={choice.code} value={choice.code}>
                  {choice.name}
                </option>
              ))}
            </SelectField>
            <TextField
              label="Labels already used on the first sheet"
              name="skip"
              type="number"
              min={0}
              max={200}
              defaultValue={0}
            />
            <Button look="main">Make the PDF</Button>
          </Form>
        </Card>
        <ul className="grid gap-2 sm:grid-cols-2">
          {boards.map((board) => (
            <li key={board.id} className="grid gap-1 rounded-lg border border-line bg-surface p-3">
              <span className="font-bold font-display">{board.tag}</span>
              <BoardEnd board={board} heightPx={20} />
              <BoardSize board={board} />
            </li>
          ))}
        </ul>
      </div>
    </>
  );
}
