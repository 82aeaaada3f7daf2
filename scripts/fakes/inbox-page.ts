import type { FakeLetter } from "./letters.ts";

/** The mail fake's page: letters, newest first, with their links to click. */
export function inboxPage(letters: FakeLetter[]): string {
  const list = letters.length
    ? letters.map(letterArticle).join("\n")
    : "<p>No letter has arrived yet. This page looks again every three seconds.</p>";
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><meta http-equiv="refresh" content="3">
<title>Mail of the demonstration</title>
<style>
  :root { color-scheme: light dark; font: 1rem/1.5 system-ui, sans-serif; }
  body { max-width: 44rem; margin: 2rem auto; padding: 0 1rem; }
  article { border-top: 1px solid color-mix(in srgb, currentColor 30%, transparent); padding: 1rem 0; }
  h2 { font-size: 1.1rem; margin: 0; } pre { white-space: pre-wrap; overflow-wrap: anywhere; font-size: 1rem; }
</style>
</head>
<body>
<h1>Mail of the demonstration</h1>
<p>Nothing here leaves this machine. Sign-in codes arrive on this page.</p>
${list}
</body>
</html>
`;
}

function letterArticle({ to, subject, text, arrivedAt }: FakeLetter): string {
  const at = arrivedAt.toISOString();
  return `<article><h2>${escapeHtml(subject)}</h2><p>to ${escapeHtml(to)}, <time datetime="${at}">${at.slice(0, 19).replace("T", " ")} UTC</time></p><pre>${withLinks(text)}</pre></article>`;
}

function withLinks(text: string): string {
  return escapeHtml(text).replace(/https?:\/\/[^\s<>]+/g, (address) => `<a href="${address}">${address}</a>`);
}

function escapeHtml(text: string): string {
  const names: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };
  return text.replace(/[&<>"]/g, (sign) => names[sign] ?? sign);
}
