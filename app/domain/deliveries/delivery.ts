import type { VolumeUnit } from "#app/core/measure/volume-units.ts";

export const dryings = ["kiln", "air", "green"] as const;
export type Drying = (typeof dryings)[number];

export const priceBases = ["bf", "m3", "lump"] as const;
export type PriceBasis = (typeof priceBases)[number];

/** A delivery as the supplier claims it and the shop received it. Its boards are a lot. */
export interface Delivery {
  id: string;
  supplierId: string;
  supplierName: string;
  /** YYYY-MM-DD. */
  receivedOn: string;
  reference: string;
  species: string;
  quarters: number;
  drying: Drying;
  grade: string;
  claimedVolume: number | null;
  claimedUnit: VolumeUnit;
  priceMinor: number | null;
  priceBasis: PriceBasis;
  freightMinor: number;
  origin: string;
  certificate: string;
  notes: string;
  talliedAt: Date | null;
  version: number;
}

export interface DeliverySummary extends Delivery {
  boards: number;
}
