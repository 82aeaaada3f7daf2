/** A value to be reproduced, with where it is published and how sure its source is. */
export interface WorkedRow {
  topic: string;
  input: string;
  expected: unknown;
  tolerance: number;
  source: string;
  confidence: string;
}

/**
 * Worked values of the trade, copied here with their sources so that the checks run wherever the program does. The fuller
 * table of the trade reference is run beside them where it is at hand.
 */
export const publishedRows: readonly WorkedRow[] = [
  {
    topic: "volume",
    input: "rough board: thickness 2 in, width 6-1/4 in, length 8 ft; surface measure",
    expected: 4,
    tolerance: 0,
    source: 'American Hardwood Export Council, grading guide (web edition), "Measurement"',
    confidence: "confirmed",
  },
  {
    topic: "volume",
    input: "same board (2 in x 6-1/4 in x 8 ft): board feet by surface measure",
    expected: 8,
    tolerance: 0,
    source: 'American Hardwood Export Council, grading guide (web edition), "Measurement"',
    confidence: "confirmed",
  },
  {
    topic: "volume",
    input: "width 6-1/2 in, length 8 ft: SM (4-1/3 before rounding)",
    expected: 4,
    tolerance: 0,
    source: "Importer reprint of NHLA SM examples; NHLA Rules for the Measurement & Inspection of Hardwood & Cypress",
    confidence: "confirmed-secondary",
  },
  {
    topic: "volume",
    input: "width 8 in, length 12 ft: SM",
    expected: 8,
    tolerance: 0,
    source: "Importer reprint of NHLA SM examples",
    confidence: "confirmed-secondary",
  },
  {
    topic: "volume",
    input: "width 10 in, length 13 ft: SM (10-10/12 before rounding)",
    expected: 11,
    tolerance: 0,
    source: "Importer reprint of NHLA SM examples",
    confidence: "confirmed-secondary",
  },
  {
    topic: "volume",
    input: "export bundle (width-length) tally of a board 5-1/4 in wide, 8-1/2 ft long",
    expected: {
      widthIn: 5,
      lengthFt: 8,
    },
    tolerance: 0,
    source: 'American Hardwood Export Council, grading guide (web edition), "Measurement"',
    confidence: "confirmed",
  },
  {
    topic: "volume",
    input: "6/4 board, 9 in x 8 ft: SM then bf",
    expected: {
      sm: 6,
      bf: 9,
    },
    tolerance: 0,
    source: "Derived from NHLA para. 18 (SM x thickness)",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "5/4 board, 7-1/2 in x 10 ft: SM (6.25 rounds to 6) then bf",
    expected: {
      sm: 6,
      bf: 7.5,
    },
    tolerance: 0,
    source: "Derived from NHLA para. 18",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "12/4 board, 5-3/4 in x 9 ft 7 in: length drops to 9 ft; 4.3125 rounds to 4; bf",
    expected: {
      lengthFt: 9,
      sm: 4,
      bf: 12,
    },
    tolerance: 0,
    source: "Derived from AHEC length rule and NHLA para. 18",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "4/4 board, 11-1/2 in x 9 ft 8 in: length drops to 9 ft; 8.625 rounds to 9",
    expected: {
      lengthFt: 9,
      sm: 9,
      bf: 9,
    },
    tolerance: 0,
    source: "Derived from AHEC length rule",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "two 4/4 boards each 6 in x 9 ft (4.5 each): half-foot ties alternate, tally total",
    expected: 9,
    tolerance: 0,
    source:
      "Alternate raising/dropping of exact half feet: NHLA Rules, from memory; AHEC confirms the same alternation for half-inch widths",
    confidence: "memory",
  },
  {
    topic: "volume",
    input: "3/4 in rough board, 12 in x 8 ft: board feet (under 1 in counts as 1 in)",
    expected: 8,
    tolerance: 0,
    source:
      'Hardwood glossary of the Wood Handbook type ("nominal thickness under 1 in is calculated as 1 in"); Griffith, Advanced Projects in Woodwork (1912)',
    confidence: "confirmed-secondary",
  },
  {
    topic: "volume",
    input: "exact volume of 2 in x 6.25 in x 96 in, no rounding",
    expected: 8.3333,
    tolerance: 0.0005,
    source: "Definition: 144 in3 per bf",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "1 m3 in board feet",
    expected: 423.776,
    tolerance: 0.001,
    source: "1 ft = 0.3048 m exactly; 12 / 0.3048^3",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "1 bf in m3",
    expected: 0.002359737,
    tolerance: 1e-9,
    source: "0.3048^3 / 12",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "1 ft3 in board feet",
    expected: 12,
    tolerance: 0,
    source: "Definition",
    confidence: "derived",
  },
  {
    topic: "volume",
    input: "27 mm x 200 mm x 2.5 m square-edged board",
    expected: 0.0135,
    tolerance: 1e-6,
    source: "Definition; equals 5.721 bf",
    confidence: "derived",
  },
  {
    topic: "volume",
    input:
      "tapered 4/4 board 12 ft long, 10 in at the wide end, 7 in at the narrow end: width one third of the length from the narrow end, then SM",
    expected: {
      widthIn: 8,
      sm: 8,
    },
    tolerance: 0,
    source: "Taper rule: NHLA Rules, General Instructions (from memory; source to be confirmed)",
    confidence: "memory",
  },
  {
    topic: "volume",
    input: "green (gross) tally 1000 bf, 7 % loss in kiln: net tally",
    expected: 930,
    tolerance: 0,
    source: "Arithmetic only; the 7 % figure is common practice",
    confidence: "derived",
  },
  {
    topic: "thickness",
    input: "5/4 rough, kiln dried: thinnest allowed by NHLA standard kiln-dried rule",
    expected: 1.1875,
    tolerance: 0,
    source:
      "NHLA Rules for the Measurement & Inspection of Hardwood & Cypress 2023, p. 56 Standard Kiln Dried Rule (worked in NHLA Rules Corner, Feb 2025)",
    confidence: "confirmed",
  },
  {
    topic: "thickness",
    input: "4/4 rough, kiln dried: thinnest allowed",
    expected: 0.9375,
    tolerance: 0,
    source:
      "NHLA Rules for the Measurement & Inspection of Hardwood & Cypress 2023, p. 56 (1/16 in scant for 3/8 to 1-3/4 in)",
    confidence: "derived",
  },
  {
    topic: "thickness",
    input: "6/4 rough, kiln dried: thinnest allowed",
    expected: 1.4375,
    tolerance: 0,
    source: "NHLA Rules for the Measurement & Inspection of Hardwood & Cypress 2023, p. 56",
    confidence: "derived",
  },
  {
    topic: "thickness",
    input: "8/4 rough, kiln dried: thinnest allowed (1/8 in scant for 2 in and thicker)",
    expected: 1.875,
    tolerance: 0,
    source: "NHLA Rules for the Measurement & Inspection of Hardwood & Cypress 2023, p. 56",
    confidence: "derived",
  },
  {
    topic: "thickness",
    input: "minimum width of a 6 in FAS board after kiln drying (1/4 in scant allowed)",
    expected: 5.75,
    tolerance: 0,
    source: "NHLA Rules for the Measurement & Inspection of Hardwood & Cypress 2023, p. 56",
    confidence: "derived",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 4/4",
    expected: 0.8125,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 5/4",
    expected: 1.0625,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 6/4",
    expected: 1.3125,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 8/4",
    expected: 1.75,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 12/4",
    expected: 2.75,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "thickness",
    input: "NHLA standard surfaced (S2S) thickness of 16/4",
    expected: 3.75,
    tolerance: 0,
    source:
      "NHLA standard surfaced thickness as tabulated in several trade tables; Wood Handbook ch. 6 table of surfaced hardwood thickness (memory)",
    confidence: "confirmed-secondary",
  },
  {
    topic: "yield",
    input: "parts net 6.5 bf from 10 bf of rough boards: yield",
    expected: 65,
    tolerance: 0,
    source: "net / gross",
    confidence: "derived",
  },
  {
    topic: "yield",
    input: "10.4 bf needed net at 65 % yield: rough to buy",
    expected: 16,
    tolerance: 0,
    source: "net / yield",
    confidence: "derived",
  },
];
