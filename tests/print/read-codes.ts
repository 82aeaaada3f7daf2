import { execFile } from "node:child_process";
import { mkdtemp, readFile, rm, writeFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import path from "node:path";
import { promisify } from "node:util";
import sharp from "sharp";
import { prepareZXingModule, readBarcodes } from "zxing-wasm/reader";

// The reader would fetch its WebAssembly from the net; it ships inside the package.
const wasmFile = createRequire(import.meta.url).resolve("zxing-wasm/reader/zxing_reader.wasm");

/** Renders the first page of a PDF with poppler at 300 dots to the inch and reads the QR codes on it, as a phone would off the paper. */
export async function codesOnFirstPage(pdf: Uint8Array): Promise<string[]> {
  const folder = await mkdtemp(path.join(tmpdir(), "print-"));
  try {
    await writeFile(path.join(folder, "page.pdf"), pdf);
    const render = ["-r", "300", "-f", "1", "-l", "1", "-singlefile", "-png", "page.pdf", "page"];
    await promisify(execFile)("pdftoppm", render, { cwd: folder });
    return await codesIn(await readFile(path.join(folder, "page.png")));
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** The texts of all QR codes in a picture, read by ZXing. */
export async function codesIn(picture: Uint8Array): Promise<string[]> {
  const { data, info } = await sharp(picture).ensureAlpha().raw().toBuffer({ resolveWithObject: true });
  prepareZXingModule({ overrides: { wasmBinary: new Uint8Array(await readFile(wasmFile)).buffer } });
  const pixels = {
    data: new Uint8ClampedArray(data),
    width: info.width,
    height: info.height,
    colorSpace: "srgb" as const,
  };
  const codes = await readBarcodes(pixels as ImageData, { formats: ["QRCode"], maxNumberOfSymbols: 30 });
  return codes.map((code) => code.text);
}
