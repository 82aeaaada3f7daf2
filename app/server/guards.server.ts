import { data, type RouterContextProvider } from "react-router";
import { actorCan } from "#app/domain/shop/actor.ts";
import type { Permission } from "#app/domain/shop/permissions.ts";
import { type AtWork, atWorkContext } from "./context.server.ts";

/**
 * The first line of every loader and action of a shop: who is at work, in which shop, and whether their role may do this.
 *
 * @throws a 403 answer when the role may not.
 */
export function requireRole(context: Readonly<RouterContextProvider>, permission: Permission): AtWork {
  const atWork = context.get(atWorkContext);
  if (!actorCan(atWork.actor, permission)) throw data({ why: "role" }, { status: 403 });
  return atWork;
}

/** The answer for what is not there, or belongs to another shop: nobody can tell which. */
export function notHere(): never {
  throw data({ why: "not here" }, { status: 404 });
}

/** Narrows what a query found, or answers 404. */
export function requireFound<T>(found: T | null | undefined): T {
  return found ?? notHere();
}
