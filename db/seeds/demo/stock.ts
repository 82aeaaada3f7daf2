import type { WoodKindName } from "#scripts/endgrain/wood-kinds.ts";

/** One delivery of the demonstration: invented, like all of it. */
export interface DemoDelivery {
  daysAgo: number;
  supplier: string;
  reference: string;
  species: string;
  kind: WoodKindName;
  quarters: number;
  drying: "kiln" | "air";
  grade: string;
  count: number;
  /** Typical width and length in inches; boards stray round them. */
  widthIn: number;
  lengthIn: number;
  pricePerBfMinor: number;
  claimedOver: number;
  origin: string;
  /** Which arms it was stacked on. */
  arms: [bay: string, level: number][];
  ringsPerInch: number;
  /** Share of its boards sawn each way. */
  sawn: { flat: number; rift: number };
}

export const bays: { name: string; note: string; arms: number; capacityKg: number }[] = [
  { name: "A", note: "White oak", arms: 4, capacityKg: 320 },
  { name: "B", note: "Maple and cherry", arms: 4, capacityKg: 320 },
  { name: "C", note: "Walnut and ash", arms: 4, capacityKg: 320 },
  { name: "D", note: "Red oak, birch, poplar", arms: 4, capacityKg: 320 },
];

export const deliveries: DemoDelivery[] = [
  {
    daysAgo: 240,
    supplier: "Harrow Hill Sawmill",
    reference: "HH-1187",
    species: "white-oak",
    kind: "oak",
    quarters: 4,
    drying: "kiln",
    grade: "FAS",
    count: 34,
    widthIn: 7.5,
    lengthIn: 108,
    pricePerBfMinor: 985,
    claimedOver: 1.015,
    origin: "Harrow Hill, within 40 miles",
    arms: [
      ["A", 1],
      ["A", 2],
    ],
    ringsPerInch: 11,
    sawn: { flat: 0.3, rift: 0.5 },
  },
  {
    daysAgo: 205,
    supplier: "Dunmore Hardwoods",
    reference: "40217",
    species: "black-walnut",
    kind: "walnut",
    quarters: 8,
    drying: "kiln",
    grade: "FAS One Face",
    count: 18,
    widthIn: 8,
    lengthIn: 96,
    pricePerBfMinor: 1450,
    claimedOver: 1.0,
    origin: "",
    arms: [
      ["C", 1],
      ["C", 2],
    ],
    ringsPerInch: 8,
    sawn: { flat: 0.6, rift: 0.3 },
  },
  {
    daysAgo: 160,
    supplier: "Dunmore Hardwoods",
    reference: "40388",
    species: "sugar-maple",
    kind: "maple",
    quarters: 4,
    drying: "kiln",
    grade: "Select",
    count: 28,
    widthIn: 6.5,
    lengthIn: 100,
    pricePerBfMinor: 720,
    claimedOver: 1.03,
    origin: "",
    arms: [["B", 1]],
    ringsPerInch: 14,
    sawn: { flat: 0.55, rift: 0.3 },
  },
  {
    daysAgo: 118,
    supplier: "Harrow Hill Sawmill",
    reference: "HH-1240",
    species: "white-ash",
    kind: "ash",
    quarters: 6,
    drying: "air",
    grade: "No. 1 Common",
    count: 24,
    widthIn: 7,
    lengthIn: 102,
    pricePerBfMinor: 410,
    claimedOver: 0.99,
    origin: "Storm-felled, Harrow Hill",
    arms: [
      ["C", 3],
      ["C", 4],
    ],
    ringsPerInch: 9,
    sawn: { flat: 0.4, rift: 0.4 },
  },
  {
    daysAgo: 92,
    supplier: "Ferrier & Daughters",
    reference: "F-77",
    species: "black-cherry",
    kind: "cherry",
    quarters: 5,
    drying: "kiln",
    grade: "FAS",
    count: 26,
    widthIn: 6.75,
    lengthIn: 104,
    pricePerBfMinor: 640,
    claimedOver: 1.02,
    origin: "",
    arms: [
      ["B", 2],
      ["B", 3],
    ],
    ringsPerInch: 12,
    sawn: { flat: 0.6, rift: 0.25 },
  },
  {
    daysAgo: 61,
    supplier: "Dunmore Hardwoods",
    reference: "40611",
    species: "northern-red-oak",
    kind: "oak",
    quarters: 4,
    drying: "kiln",
    grade: "FAS",
    count: 26,
    widthIn: 7.25,
    lengthIn: 112,
    pricePerBfMinor: 560,
    claimedOver: 1.01,
    origin: "",
    arms: [
      ["D", 1],
      ["D", 2],
    ],
    ringsPerInch: 8,
    sawn: { flat: 0.45, rift: 0.35 },
  },
  {
    daysAgo: 38,
    supplier: "Ferrier & Daughters",
    reference: "F-83",
    species: "yellow-birch",
    kind: "maple",
    quarters: 4,
    drying: "kiln",
    grade: "Select",
    count: 18,
    widthIn: 6.25,
    lengthIn: 98,
    pricePerBfMinor: 495,
    claimedOver: 1.0,
    origin: "",
    arms: [["D", 3]],
    ringsPerInch: 16,
    sawn: { flat: 0.65, rift: 0.25 },
  },
  {
    daysAgo: 12,
    supplier: "Harrow Hill Sawmill",
    reference: "HH-1302",
    species: "white-oak",
    kind: "oak",
    quarters: 8,
    drying: "air",
    grade: "FAS",
    count: 16,
    widthIn: 8.5,
    lengthIn: 120,
    pricePerBfMinor: 1120,
    claimedOver: 1.04,
    origin: "Harrow Hill, within 40 miles",
    arms: [
      ["A", 3],
      ["A", 4],
    ],
    ringsPerInch: 10,
    sawn: { flat: 0.2, rift: 0.5 },
  },
  {
    daysAgo: 5,
    supplier: "Ferrier & Daughters",
    reference: "F-91",
    species: "yellow-poplar",
    kind: "cherry",
    quarters: 4,
    drying: "kiln",
    grade: "No. 1 Common",
    count: 14,
    widthIn: 8.25,
    lengthIn: 118,
    pricePerBfMinor: 265,
    claimedOver: 1.0,
    origin: "",
    arms: [["D", 4]],
    ringsPerInch: 7,
    sawn: { flat: 0.8, rift: 0.15 },
  },
];
