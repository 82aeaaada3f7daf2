import { useEffect, useState } from "react";
import { useNavigation } from "react-router";

interface AsOpened {
  formId: string;
  /** The record as the page shows it now: its version, and what its form would show before anybody types. */
  version: number;
  defaults: Record<string, string>;
  /** The refusal by which somebody was told that the record changed, new with every refusal. */
  stale: object | null | undefined;
}

/**
 * The version that a form is saved from: the one it was opened with, though the page underneath may be drawn anew, until a refusal tells that the record
 * changed. Boxes that nobody touched then show what the record says now, so that saving again changes only what was typed.
 */
export function useRecordAsOpened({ formId, version, defaults, stale }: AsOpened): number {
  const [opened, setOpened] = useState({ version, defaults, toldBy: stale });
  const { state } = useNavigation();
  useEffect(() => {
    if (!stale || state !== "idle" || opened.toldBy === stale) return;
    followUntouched(formId, opened.defaults, defaults);
    setOpened({ version, defaults, toldBy: stale });
  }, [formId, version, defaults, stale, state, opened]);
  return opened.version;
}

function followUntouched(formId: string, was: Record<string, string>, is: Record<string, string>): void {
  const boxes = document.forms.namedItem(formId)?.elements;
  for (const [name, value] of Object.entries(is)) {
    const box = boxes?.namedItem(name);
    if (box && "value" in box && box.value === was[name]) box.value = value;
  }
}
