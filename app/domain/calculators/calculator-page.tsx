import type { ReactNode } from "react";
import { Form, href, Link } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import type { Source } from "#app/domain/sources/source.ts";
import { SourceList } from "#app/domain/sources/source-list.tsx";
import type { Asked } from "./ask.ts";
import type { Calculator } from "./calculators.ts";

interface CalculatorPageProps<Name extends string, Answer> {
  calculator: Calculator;
  asked: Asked<Name, Answer>;
  /** The boxes. */
  children: ReactNode;
  /** The answer: plot or drawing first, then figures. */
  result: (answer: Answer) => ReactNode;
  /** The formula as one would write it, a line each. */
  formula: string[];
  sources: Source[];
}

/**
 * The frame of every calculator: boxes on the left, the answer on the right (below, on a phone), then the formula and
 * where it comes from. A plain GET form: the figures are in the address, and it works without JavaScript.
 */
export function CalculatorPage<Name extends string, Answer>(props: CalculatorPageProps<Name, Answer>) {
  const { calculator, asked, children, result, formula, sources } = props;
  const wrong = Object.keys(asked.errors).length > 0;
  return (
    <>
      <PageHead
        title={calculator.title}
        lead={calculator.lead}
        over={
          <Link to={href("/calculators")} className="text-link underline-offset-4 hover:underline">
            Calculators
          </Link>
        }
      />
      <div className="grid items-start gap-4 lg:grid-cols-[22rem_minmax(0,1fr)]">
        <Card className="lg:sticky lg:top-4">
          <Form
            method="get"
            action={`${calculator.path}#result`}
            key={JSON.stringify(asked.values)}
            className="grid gap-4"
            aria-label={calculator.title}
          >
            {children}
            <div className="flex flex-wrap gap-2" data-screen-only>
              <Button look="main" className="flex-1">
                Work it out
              </Button>
              <Link
                to={calculator.path}
                className="inline-flex min-h-11 items-center px-3 text-link underline-offset-4 hover:underline"
              >
                Start again
              </Link>
            </div>
          </Form>
        </Card>
        <div id="result" className="grid scroll-mt-4 gap-4 lg:scroll-mt-96">
          {wrong ? (
            <Notice kind="wrong" title="Something typed will not do">
              What would be right stands beside the box.
            </Notice>
          ) : null}
          {asked.refused ? (
            <Notice kind="wrong" title="These figures together have no answer">
              {asked.refused}
            </Notice>
          ) : null}
          {asked.answer === null ? null : result(asked.answer)}
          <FormulaAndSources formula={formula} sources={sources} />
        </div>
      </div>
    </>
  );
}

/** How it was worked out, and from what: whoever doubts a figure can check it. */
function FormulaAndSources({ formula, sources }: { formula: string[]; sources: Source[] }) {
  return (
    <Card title="How it is worked out">
      <ul className="grid gap-1.5">
        {formula.map((line) => (
          <li key={line} className="font-mono text-sm leading-relaxed">
            {line}
          </li>
        ))}
      </ul>
      <h3 className="mt-4 mb-1 font-semibold text-lg">Where it comes from</h3>
      <SourceList sources={sources} />
    </Card>
  );
}
