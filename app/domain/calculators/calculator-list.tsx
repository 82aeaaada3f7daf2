import { Link } from "react-router";
import { CalculatorDrawing } from "./calculator-drawing.tsx";
import { type CalculatorName, calculators } from "./calculators.ts";

/** All calculators, each with a small drawing of what it answers. */
export function CalculatorList() {
  return (
    <ul className="grid gap-3 sm:grid-cols-2 lg:grid-cols-3">
      {(Object.keys(calculators) as CalculatorName[]).map((name) => {
        const { path, title, lead } = calculators[name];
        return (
          <li key={name}>
            <Link
              to={path}
              className="flex h-full gap-4 rounded-xl border border-line bg-surface p-4 text-ink no-underline hover:border-line-strong hover:bg-sunk"
            >
              <CalculatorDrawing name={name} />
              <span>
                <span className="block font-display font-semibold text-lg leading-snug">{title}</span>
                <span className="block text-ink-soft">{lead}</span>
              </span>
            </Link>
          </li>
        );
      })}
    </ul>
  );
}
