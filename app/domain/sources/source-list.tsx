import { confidenceWords, type Source } from "./source.ts";

/** Sources with how well each is known. */
export function SourceList({ sources }: { sources: Source[] }) {
  return (
    <ul className="grid gap-1.5">
      {sources.map(({ of, text, confidence }) => (
        <li key={`${of} ${text}`}>
          {of}: {text} <span className="text-ink-soft">({confidenceWords(confidence)})</span>
        </li>
      ))}
    </ul>
  );
}
