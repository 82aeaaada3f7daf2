/** The readable part of a letter. */
export interface ParsedLetter {
  /** The bare address, in lower case. */
  to: string;
  subject: string;
  text: string;
}

/** Reads one letter as this program sends them: plain text, or plain text beside html. Enough of MIME for the mail fake, no more. */
export function parseLetter(source: string): ParsedLetter {
  const { headers, body } = splitHeaders(source);
  const to = headers.get("to") ?? "";
  return {
    to: (/<([^>]+)>/.exec(to)?.[1] ?? to).trim().toLowerCase(),
    subject: decodeWords(headers.get("subject") ?? ""),
    text: plainText(headers, body),
  };
}

function splitHeaders(source: string): { headers: Map<string, string>; body: string } {
  const [head = "", ...rest] = source.replaceAll("\r\n", "\n").split("\n\n");
  // A header goes on in lines that begin with white space (RFC 5322, 2.2.3).
  const lines = head.replace(/\n[ \t]+/g, " ").split("\n");
  const headers = new Map(
    lines.map((line) => [line.slice(0, line.indexOf(":")).toLowerCase(), line.slice(line.indexOf(":") + 1).trim()]),
  );
  return { headers, body: rest.join("\n\n") };
}

function plainText(headers: Map<string, string>, body: string): string {
  const boundary = /boundary="?([^";]+)/.exec(headers.get("content-type") ?? "")?.[1];
  if (boundary) {
    const parts = body
      .split(`--${boundary}`)
      .slice(1, -1)
      .map((part) => splitHeaders(part.replace(/^\r?\n/, "")));
    const plain = parts.find((part) => (part.headers.get("content-type") ?? "text/plain").startsWith("text/plain"));
    return plain ? plainText(plain.headers, plain.body) : "";
  }
  const encoding = headers.get("content-transfer-encoding")?.toLowerCase();
  if (encoding === "base64") return Buffer.from(body, "base64").toString("utf8").trim();
  if (encoding === "quoted-printable") return decodeQuotedPrintable(body).trim();
  return body.trim();
}

function decodeQuotedPrintable(text: string): string {
  const joined = text.replace(/=\n/g, "");
  return Buffer.from(
    joined.replace(/=([0-9A-F]{2})/gi, (_, hex) => String.fromCharCode(Number.parseInt(hex, 16))),
    "latin1",
  ).toString("utf8");
}

/** Words of a header beyond ASCII (RFC 2047). White space between two of them does not count. */
function decodeWords(text: string): string {
  return text
    .replace(/(\?=)\s+(=\?)/g, "$1$2")
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind, word) =>
      kind.toLowerCase() === "b"
        ? Buffer.from(word, "base64").toString("utf8")
        : decodeQuotedPrintable(word.replaceAll("_", " ")),
    );
}
