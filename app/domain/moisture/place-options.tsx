import { placeNames, placeWords } from "./places.ts";

/** Where a piece will live, for a select. `here` is what the first is called. */
export function PlaceOptions({ here = placeWords["this-shop"] }: { here?: string }) {
  return placeNames.map((name) => (
    <option key={name} value={name}>
      {name === "this-shop" ? here : placeWords[name]}
    </option>
  ));
}
