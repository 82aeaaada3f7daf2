interface CautionListProps {
  cautions: { id: string; words: string; source: string }[];
}

/** Cautions beside the number that calls for them, each with where it comes from; never something to click away. */
export function CautionList({ cautions }: CautionListProps) {
  if (cautions.length === 0) return null;
  return (
    <ul className="mt-3 grid gap-2">
      {cautions.map((caution) => (
        <li key={caution.id} className="rounded-lg border-caution border-l-4 bg-caution-ground px-4 py-3">
          <p>{caution.words}</p>
          <p className="text-ink-soft text-sm">{caution.source}</p>
        </li>
      ))}
    </ul>
  );
}
