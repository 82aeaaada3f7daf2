import { z } from "zod";

/** Digits behind the point of a currency: 2 for most, 0 for yen, 3 for a few. From the runtime's own currency table. */
export function minorDigits(currency: string): number {
  return new Intl.NumberFormat("en", { style: "currency", currency }).resolvedOptions().maximumFractionDigits ?? 2;
}

/** Money as people read it. Amounts are whole minor units (cents) everywhere; they become text only here. */
export function printMoney(minor: number, currency: string): string {
  return new Intl.NumberFormat("en", { style: "currency", currency }).format(minor / 10 ** minorDigits(currency));
}

/** The amount alone, for a form's box: "412.50". */
export function moneyInput(minor: number | null, currency: string): string {
  return minor === null ? "" : (minor / 10 ** minorDigits(currency)).toFixed(minorDigits(currency));
}

/** The most that one amount may be, in minor units: beyond it, somebody slipped. */
const mostMinor = 10_000_000_00;

/**
 * Reads an amount typed with or without a sign, spaces or thousands commas: "1,240.50", "$8.75", "9".
 *
 * @returns minor units, or why not.
 */
export function parseMoney(typed: string, currency: string): { ok: true; minor: number } | { ok: false; why: string } {
  const text = typed.replace(/[\s$€£¥]/g, "").replace(/,(?=\d{3}(\D|$))/g, "");
  const digits = minorDigits(currency);
  const match = /^(\d+)(?:[.,](\d+))?$/.exec(text);
  if (!match) return { ok: false, why: "Write an amount such as 1240.50." };
  const behind = match[2] ?? "";
  if (behind.length > digits) return { ok: false, why: `At most ${digits} digits behind the point.` };
  const minor = Number(`${match[1]}${behind.padEnd(digits, "0")}`);
  if (minor > mostMinor) return { ok: false, why: `At most ${printMoney(mostMinor, currency)}.` };
  return { ok: true, minor };
}

/** An amount in a form: text in, minor units out, null when left empty. */
export function moneyField(currency: string) {
  return z
    .string()
    .default("")
    .transform((typed, context) => {
      if (typed.trim() === "") return null;
      const parsed = parseMoney(typed, currency);
      if (parsed.ok) return parsed.minor;
      context.addIssue({ code: "custom", message: parsed.why });
      return z.NEVER;
    });
}
