import { execFile } from "node:child_process";
import { existsSync } from "node:fs";
import { mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";

/** Of poppler-utils. Tests that look at printed pages are skipped where it is not installed. */
export const canRender = existsSync("/usr/bin/pdftoppm");

/** A printed page in grey, a byte a dot: 0 is black. */
export interface PrintedPage {
  dots: Uint8Array;
  width: number;
  height: number;
}

/** Prints one page of a PDF, from 1, at so many dots to the inch. */
export async function renderPage(pdf: Uint8Array, page: number, dotsPerInch: number): Promise<PrintedPage> {
  const folder = await mkdtemp(path.join(tmpdir(), "print-"));
  try {
    await writeFile(path.join(folder, "page.pdf"), pdf);
    const which = ["-f", String(page), "-l", String(page), "-singlefile"];
    const render = ["-r", String(dotsPerInch), ...which, "-gray", "page.pdf", "page"];
    await promisify(execFile)("pdftoppm", render, { cwd: folder });
    return readGreymap(await readFile(path.join(folder, "page.pgm")));
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** A portable greymap: "P5 width height 255" and the dots. */
function readGreymap(file: Buffer): PrintedPage {
  const head = /^P5\s+(\d+)\s+(\d+)\s+255\s/.exec(file.subarray(0, 40).toString("latin1"));
  if (!head) throw new Error("no greymap");
  return { dots: file.subarray(head[0].length), width: Number(head[1]), height: Number(head[2]) };
}
