import { data, href, type RouterContextProvider, redirect } from "react-router";
import type { z } from "zod";
import { actorCan } from "#app/domain/shop/actor.ts";
import type { Permission } from "#app/domain/shop/permissions.ts";
import { type AtWork, atWorkContext, type Visit, visitContext } from "./context.server.ts";

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

/** For pages of a person, not of a shop: who is signed in. A stranger signs in and comes back. */
export function requireVisit(context: Readonly<RouterContextProvider>, url: URL): Visit {
  const visit = context.get(visitContext);
  if (!visit) throw redirect(`${href("/sign-in")}?${new URLSearchParams({ to: url.pathname + url.search })}`);
  return visit;
}

/**
 * The fields of a small form that our own pages always fill right: buttons and choices.
 *
 * @throws a 400 answer for anything else.
 */
export async function requireForm<T>(request: Request, schema: z.ZodType<T>): Promise<T> {
  const parsed = schema.safeParse(Object.fromEntries(await request.formData()));
  if (!parsed.success) throw data({ why: "form" }, { status: 400 });
  return parsed.data;
}

/** The version of the record that a form was made from. What is no number fits no record, so that the save is refused as overtaken. */
export function formVersion(formData: FormData): number {
  const version = Number(formData.get("version"));
  return Number.isSafeInteger(version) ? version : 0;
}
