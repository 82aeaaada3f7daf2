import type { DemoPerson } from "./demo.ts";

/** What is printed once the shop is open. */
export function welcome({
  address,
  people,
  inboxUrl,
}: {
  address: string;
  people: DemoPerson[];
  inboxUrl: string | null;
}): string {
  const lines = ["", `Rayfleck is open at ${address}`, ""];
  if (people.length) {
    lines.push(`Sign in as somebody of the demonstration shop, ${people[0]?.shop}:`);
    const width = Math.max(...people.map(({ email }) => email.length));
    for (const { role, email, name } of people) lines.push(`  ${role.padEnd(7)} ${email.padEnd(width)}  ${name}`);
    lines.push("");
  }
  if (inboxUrl) lines.push(`Mail, sign-in codes too, arrives at ${inboxUrl}`);
  lines.push("Ctrl-C stops everything.", "");
  return lines.join("\n");
}
