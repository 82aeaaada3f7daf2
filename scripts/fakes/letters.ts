import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { parseLetter } from "./parse-letter.ts";

export interface FakeLetter {
  /** The bare address, in lower case. */
  to: string;
  subject: string;
  text: string;
  arrivedAt: Date;
}

/** What the mail fake keeps in a folder, newest first. */
export async function listLetters(
  folder: string,
  { since = new Date(0), atMost = Infinity } = {},
): Promise<FakeLetter[]> {
  const names = (await readdir(folder)).filter((name) => name.endsWith(".eml") && arrivedAt(name) >= since);
  const newest = names.sort().reverse().slice(0, atMost);
  return Promise.all(
    newest.map(async (name) => ({
      ...parseLetter(await readFile(path.join(folder, name), "utf8")),
      arrivedAt: arrivedAt(name),
    })),
  );
}

/** The newest sign-in code mailed to somebody, or null. Codes are six digits; those in links do not count. */
export async function newestCode(folder: string, email: string, since?: Date): Promise<string | null> {
  const letters = await listLetters(folder, { since });
  for (const { to, text } of letters) {
    const code = /(?<![\d-])\d{6}(?![\d-])/.exec(text.replace(/https?:\S+/g, ""));
    if (code && to === email.toLowerCase()) return code[0];
  }
  return null;
}

/** A name begins with the moment of arrival, written so that names are in order and may be a file's. */
export function letterName(at: Date, tail: string): string {
  return `${at.toISOString().replaceAll(":", "-")}-${tail}.eml`;
}

function arrivedAt(name: string): Date {
  return new Date(name.slice(0, 24).replace(/T(\d\d)-(\d\d)-/, "T$1:$2:"));
}
