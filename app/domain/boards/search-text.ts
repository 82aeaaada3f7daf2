import { speciesByCode } from "#app/core/species/species.ts";

interface Searched {
  tag: string;
  species: string;
  grade: string;
  figureKind: string;
  figureWhere: string;
  colourNote: string;
  notes: string;
  logName: string;
}

/** The words a board is found by, in one column with a full-text index. Written again whenever one of them changes. */
export function searchText(board: Searched): string {
  const words = [
    board.tag,
    speciesByCode(board.species)?.commonName ?? board.species,
    board.grade,
    board.figureKind,
    board.figureWhere,
    board.colourNote,
    board.logName,
    board.notes,
  ];
  return words.filter(Boolean).join(" ").slice(0, 1000);
}
