import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { parseLetter } from "./parse-letter.ts";

export interface FakeLetter {
  to: string;
  subject: string;
  text: string;
  arrivedAt: Date;
}

/** What the mail fake keeps in a folder, newest first. */
export async function listLetters(folder: string, atMost = 50): Promise<FakeLetter[]> {
  const names = (await readdir(folder)).filter((name) => name.endsWith(".eml"));
  // Names begin with the moment of arrival.
  const newest = names.sort().reverse().slice(0, atMost);
  return Promise.all(
    newest.map(async (name) => ({
      ...parseLetter(await readFile(path.join(folder, name), "utf8")),
      arrivedAt: new Date(name.slice(0, 24).replace(/T(\d\d)-(\d\d)-/, "T$1:$2:")),
    })),
  );
}

/** The newest sign-in code mailed to somebody, or null. Codes are six digits. */
export async function newestCode(folder: string, email: string): Promise<string | null> {
  const letters = await listLetters(folder, 1000);
  for (const letter of letters.filter(({ to }) => to === email.toLowerCase())) {
    const code = /(?<![\d-])\d{6}(?![\d-])/.exec(letter.text.replace(/https?:\S+/g, ""))?.[0];
    if (code) return code;
  }
  return null;
}
