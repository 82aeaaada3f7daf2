import { notHere } from "#app/server/guards.server.ts";

/** Any address that is none of ours. A route of its own, so that the root's middleware runs and the answer carries its headers. */
export function loader() {
  notHere();
}

export function action() {
  notHere();
}

export default function NotHere() {
  return null;
}
