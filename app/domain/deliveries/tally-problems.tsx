import { Notice } from "#app/components/notice.tsx";
import type { TallyProblem } from "./read-tally.ts";

const most = 12;

/** Lines of a tally that could not be read, when it came back unsaved. */
export function TallyProblems({ problems }: { problems: TallyProblem[] }) {
  if (problems.length === 0) return null;
  return (
    <Notice kind="wrong" title="Not saved yet: some lines cannot be read" className="mb-4">
      <ul className="list-disc pl-5">
        {problems.slice(0, most).map(({ lineNumber, field, message }) => (
          <li key={`${lineNumber} ${field}`}>
            Line {lineNumber}, {field}: {message}
          </li>
        ))}
      </ul>
      {problems.length > most ? <p>And {problems.length - most} more.</p> : null}
    </Notice>
  );
}
