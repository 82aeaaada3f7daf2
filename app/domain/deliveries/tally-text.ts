import { allSpecies } from "#app/core/species/species.ts";
import { isBlank, type TallyRow } from "./tally.ts";
import { splitSize } from "./tally-size.ts";

type Carried = Pick<TallyRow, "quarters" | "species">;

/** A typed line with where it stood, so that a message can name it. */
export interface NumberedRow {
  /** From 1, empty lines counted. */
  lineNumber: number;
  row: TallyRow;
}

/**
 * Reads a tally written as text, one line for each size: `8 1/4 x 10'6"`, `3 @ 8 x 10', 5/4, walnut`, `5/4 x 8 x 10'`, or cells from a sheet
 * (width and length, or count, width and length, then quarters and species). Quarters and species hold until another is given.
 *
 * @param carried for lines before any is given: what the delivery says.
 */
export function readTallyText(text: string, carried: Carried): NumberedRow[] {
  let { quarters, species } = carried;
  return text.split(/\r\n|\r|\n/).flatMap((line, index) => {
    const row = readLine(line);
    if (!row) return [];
    quarters = row.quarters || quarters;
    species = row.species || species;
    return [{ lineNumber: index + 1, row: { ...row, quarters, species } }];
  });
}

/** One line, its quarters and species empty where it gives none; null for an empty line. */
function readLine(line: string): TallyRow | null {
  if (line.trim() === "") return null;
  const pieces = line.includes("\t") ? cells(line) : line.split(/;\s*|,\s+/);
  const [size = "", ...rest] = pieces.map((piece) => piece.trim());
  const row: TallyRow = { count: "", width: size, length: "", quarters: "", species: "", ...splitSize(size) };
  const words: string[] = [];
  for (const piece of rest.filter((text) => text !== "")) {
    const quarters = /^(\d+)\s*\/\s*4$/.exec(piece)?.[1];
    const count = /^(\d+)\s*(?:pcs?\.?|pieces)?$/i.exec(piece)?.[1];
    if (quarters) row.quarters = quarters;
    else if (count) row.count = count;
    else words.push(piece);
  }
  row.species = words.length > 0 ? speciesNamed(words.join(", ")) : "";
  return row;
}

/** Cells of a sheet, the size put into one piece. Three figures are count, width and length. */
function cells(line: string): string[] {
  const [a = "", b = "", c = "", ...rest] = line.split("\t").map((cell) => cell.trim());
  if (splitSize(a)) return [a, b, c, ...rest];
  if (/^\d{1,3}$/.test(a) && /^\d/.test(c) && !/^\d+\s*\/\s*4$/.test(c)) return [`${a} @ ${b} x ${c}`, ...rest];
  return [`${a} x ${b}`, c, ...rest];
}

/** The code of a species by any of its names; the words themselves when there is none, for the message to quote. */
function speciesNamed(words: string): string {
  const wanted = words.toLowerCase();
  const found = allSpecies().find(({ code, commonName, indexName }) =>
    [code, commonName, indexName].some((name) => name.toLowerCase() === wanted),
  );
  const other = allSpecies().find(({ otherNames }) => otherNames.some((name) => name.toLowerCase() === wanted));
  return (found ?? other)?.code ?? words;
}

/** Writes rows the way readTallyText reads them. */
export function printTallyText(rows: TallyRow[], carried: Carried): string {
  let { quarters, species } = carried;
  const lines = rows
    .filter((row) => !isBlank(row))
    .map((row) => {
      const count = row.count.trim() === "" || row.count.trim() === "1" ? "" : `${row.count.trim()} @ `;
      const size = row.length.trim() === "" ? row.width.trim() : `${row.width.trim()} x ${row.length.trim()}`;
      const more = [
        row.quarters === quarters ? null : `${row.quarters.replace(/\/4$/, "")}/4`,
        row.species === species ? null : row.species,
      ];
      ({ quarters, species } = row);
      return [`${count}${size}`, ...more].filter(Boolean).join(", ");
    });
  return lines.join("\n");
}
