const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

/** A day as people write it, "4 Mar 2027", from YYYY-MM-DD or a moment. Server and browser print the same: nothing depends on the place. */
export function printDay(day: string | Date): string {
  const [year, month, date] = (typeof day === "string" ? day : day.toISOString().slice(0, 10)).split("-").map(Number);
  return `${date} ${months[(month ?? 1) - 1]} ${year}`;
}

/** A moment for people, with its exact time for machines and on hover. Times are UTC and say so. */
export function When({ at }: { at: Date }) {
  const iso = at.toISOString();
  return (
    <time dateTime={iso} title={`${iso.slice(11, 16)} UTC`}>
      {printDay(at)}, {iso.slice(11, 16)}
    </time>
  );
}
