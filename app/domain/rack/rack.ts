/** An arm of the rack: a cantilever level of a bay; 1 is the lowest. */
export interface Arm {
  id: string;
  level: number;
  widthMm: number;
  /** What the rack's maker allows on it, as the shop entered it; null when nobody did. */
  capacityKg: number | null;
}

export interface Bay {
  id: string;
  name: string;
  note: string;
  arms: Arm[];
}

/** How people call an arm. */
export function armName(bay: Pick<Bay, "name">, arm: Pick<Arm, "level">): string {
  return `Bay ${bay.name}, arm ${arm.level}`;
}
