import { useQuery } from "@tanstack/react-query";
import { useDeferredValue, useState } from "react";
import { ComboBox, Input, Label, ListBox, ListBoxItem, Popover } from "react-aria-components";
import { Form, href, useNavigate } from "react-router";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { findBoardsQuery } from "./boards.queries.ts";
import { BoardSize } from "./size-text.tsx";

/** Finding a board while typing its tag or any word of its record. Enter alone opens the list; so it does without JavaScript. */
export function FindBoard({ className }: { className?: string }) {
  const [typed, setTyped] = useState("");
  const navigate = useNavigate();
  const { data, isFetching } = useQuery(findBoardsQuery(useDeferredValue(typed.trim())));
  return (
    <Form action={href("/boards")} role="search" className={className}>
      <input type="hidden" name="state" value="any" />
      <ComboBox
        name="q"
        formValue="text"
        allowsCustomValue
        allowsEmptyCollection
        menuTrigger="input"
        inputValue={typed}
        onInputChange={setTyped}
        items={data?.boards ?? []}
        defaultFilter={() => true}
        onSelectionChange={(id) => {
          if (!id) return;
          setTyped("");
          navigate(href("/boards/:boardId", { boardId: String(id) }));
        }}
      >
        <Label className="sr-only">Find a board, tag or word</Label>
        <Input
          placeholder="Find a board, tag or word"
          onKeyDownCapture={(event) => {
            // With no board picked out of the open list, Enter asks for all that match.
            if (event.key !== "Enter" || event.currentTarget.getAttribute("aria-activedescendant")) return;
            event.preventDefault();
            event.currentTarget.form?.requestSubmit();
          }}
          className="min-h-11 w-full rounded-lg border border-iron-500 bg-transparent px-3 text-bar-ink placeholder:text-bar-soft"
        />
        <Popover className="w-(--trigger-width) min-w-72 overflow-auto rounded-xl border border-line bg-surface p-1.5 shadow-lg">
          <ListBox
            className="outline-none"
            renderEmptyState={() => (
              <p className="px-3 py-2 text-ink-soft">{isFetching ? "Looking" : "Nothing like that"}</p>
            )}
          >
            {(board: NonNullable<typeof data>["boards"][number]) => (
              <ListBoxItem
                id={board.id}
                textValue={board.tag}
                className="cursor-pointer rounded-md px-3 py-2 text-ink outline-none data-focused:bg-sunk"
              >
                <span className="flex justify-between gap-3">
                  <strong className="font-display">{board.tag}</strong>
                  <span className="text-ink-soft text-sm">{board.place ?? board.state}</span>
                </span>
                <span className="block text-sm">
                  {speciesName(board.species)}, <BoardSize board={board} />
                </span>
              </ListBoxItem>
            )}
          </ListBox>
        </Popover>
      </ComboBox>
    </Form>
  );
}
