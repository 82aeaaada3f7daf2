import type { ReactNode } from "react";
import type { CalculatorName } from "./calculators.ts";

const wood = "#e2c79b";
const grain = "#a88a55";
const edge = "#5b4a33";
const crayon = "#1d4ed8";

const board = <rect x="4" y="30" width="88" height="22" rx="1.5" fill={wood} stroke={edge} />;
const line = { fill: "none", strokeWidth: 2.5, strokeLinecap: "round" } as const;

/** What each calculator is about, in a few strokes. Wood and crayon look alike in a lit and a dim shop. */
const drawings: Record<CalculatorName, ReactNode> = {
  measure: (
    <>
      <path d="M4 28L92 20V60L4 54Z" fill={wood} stroke={edge} />
      <path d="M33 25.5V56" stroke={crayon} strokeDasharray="5 3" {...line} />
    </>
  ),
  claim: (
    <>
      <rect x="8" y="22" width="80" height="14" fill={wood} stroke={edge} />
      <rect x="8" y="44" width="70" height="14" fill={wood} stroke={edge} />
      <path d="M78 44V58M88 22V58" stroke="#c2301c" {...line} />
    </>
  ),
  rings: (
    <>
      {board}
      <path
        d="M38 52A12 12 0 0 1 58 52M28 52A21 21 0 0 1 68 52M20 52Q26 38 40 31M76 52Q70 38 56 31M10 52Q14 40 24 31M86 52Q82 40 72 31"
        stroke={grain}
        {...line}
      />
    </>
  ),
  leg: (
    <>
      <rect x="22" y="14" width="52" height="52" fill={wood} stroke={edge} />
      <path d="M22 46L42 66M22 30L58 66M22 14L74 66M38 14L74 50M54 14L74 34" stroke={grain} {...line} />
    </>
  ),
  air: <path d="M6 66C30 58 52 52 66 38S84 18 90 10" stroke="currentColor" {...line} />,
  meter: (
    <>
      <rect x="4" y="46" width="88" height="18" fill={wood} stroke={edge} />
      <path d="M40 46V32M56 46V32" stroke="currentColor" {...line} />
      <rect x="32" y="10" width="32" height="22" rx="4" fill="none" stroke="currentColor" strokeWidth="2.5" />
    </>
  ),
  ready: (
    <>
      <rect x="4" y="50" width="88" height="12" fill="currentColor" opacity="0.15" />
      <path d="M6 14C24 42 46 54 90 57" stroke="currentColor" {...line} />
      <path d="M52 52V66" stroke={crayon} {...line} />
    </>
  ),
  movement: (
    <>
      <path d="M4 34Q48 48 92 34V54Q48 68 4 54Z" fill={wood} stroke={edge} />
      <rect x="4" y="32" width="88" height="22" fill="none" stroke={crayon} strokeWidth="2" strokeDasharray="5 4" />
    </>
  ),
  weight: (
    <>
      <path d="M8 10V72M8 60H92" stroke="currentColor" {...line} strokeWidth="5" />
      {[46, 31, 16].map((y) => (
        <rect key={y} x="18" y={y} width="62" height="11" fill={wood} stroke={edge} />
      ))}
    </>
  ),
  grade: (
    <>
      <rect x="4" y="20" width="88" height="40" fill={wood} stroke={edge} />
      <ellipse cx="52" cy="38" rx="5" ry="4" fill={edge} />
      <path d="M7 23H44V57H7ZM60 23H89V57H60Z" stroke={crayon} {...line} />
    </>
  ),
  glueUp: (
    <>
      <rect x="14" y="22" width="68" height="17" fill={wood} stroke={edge} />
      <rect x="14" y="41" width="68" height="17" fill={wood} stroke={edge} />
      <path d="M28 8V20M68 8V20M28 72V60M68 72V60" stroke="currentColor" {...line} />
    </>
  ),
  milling: (
    <>
      <rect x="10" y="12" width="76" height="56" fill="none" stroke={edge} strokeDasharray="5 4" />
      <rect x="18" y="20" width="60" height="40" fill="none" stroke={edge} strokeDasharray="5 4" />
      <rect x="26" y="27" width="44" height="26" fill={wood} stroke={edge} />
    </>
  ),
};

export function CalculatorDrawing({ name }: { name: CalculatorName }) {
  return (
    <svg viewBox="0 0 96 80" className="h-16 w-20 shrink-0" aria-hidden="true">
      {drawings[name]}
    </svg>
  );
}
