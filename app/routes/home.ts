import { href, redirect } from "react-router";

/** The front door is the rack; its guard sends a stranger to sign in. */
export function loader() {
  return redirect(href("/rack"));
}
