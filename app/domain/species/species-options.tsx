import { allSpecies } from "#app/core/species/species.ts";

/** Every species for a select, as an index lists them: "Oak, white". */
export function SpeciesOptions() {
  return allSpecies().map((species) => (
    <option key={species.code} value={species.code}>
      {species.indexName}
    </option>
  ));
}
