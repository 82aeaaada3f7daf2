import { data, href, type MiddlewareFunction, type RouterContextProvider, redirect } from "react-router";
import { isIdentifier } from "#app/core/identifiers/identifier.ts";
import { membershipOf } from "#app/domain/people/people.sql.server.ts";
import { getShop } from "#app/domain/shop/shops.sql.server.ts";
import { type AtWork, atWorkContext, dbContext, visitContext } from "./context.server.ts";
import { notHere } from "./guards.server.ts";
import { isWrite, originOf } from "./origin.server.ts";

/** Who is at work, or what is missing: a sign-in, or a shop. The membership is read anew for every request, so a removed person is out at once. */
async function findAtWork(context: Readonly<RouterContextProvider>): Promise<AtWork | "sign in" | "no shop"> {
  const visit = context.get(visitContext);
  if (!visit) return "sign in";
  const db = context.get(dbContext);
  const membership = visit.shopId ? await membershipOf(db, visit.personId, visit.shopId) : null;
  const shop = membership ? await getShop(db, membership.shopId) : null;
  if (!membership || !shop) return "no shop";
  const { personId, personName } = visit;
  return { actor: { personId, personName, shopId: shop.id, role: membership.role }, shop };
}

/** Guards a shop's pages: a stranger signs in and comes back, a person without a shop chooses or opens one. */
export const requireAtWork: MiddlewareFunction<Response> = async ({ request, context, params, url }) => {
  // The framework asks this for addresses that have a page, not for buttons that post to one without.
  if (isWrite(request) && originOf(request) === "foreign") throw data({ why: "origin" }, { status: 403 });
  const found = await findAtWork(context);
  if (found === "sign in")
    throw redirect(`${href("/sign-in")}?${new URLSearchParams({ to: url.pathname + url.search })}`);
  if (found === "no shop") throw redirect(href("/shops"));
  requireIdentifiers(params);
  context.set(atWorkContext, found);
};

/** Guards JSON addresses: answers in JSON, and takes writes from our own pages only. */
export const requireAtWorkJson: MiddlewareFunction<Response> = async ({ request, context, params }) => {
  // A browser says where a write comes from. One that says nothing is no browser of ours.
  if (isWrite(request) && originOf(request) !== "ours") throw data({ why: "origin" }, { status: 403 });
  const found = await findAtWork(context);
  if (typeof found === "string") throw data({ why: found }, { status: found === "sign in" ? 401 : 403 });
  requireIdentifiers(params);
  context.set(atWorkContext, found);
};

/** What cannot be an identifier is not here, and never gets as far as a query: the database refuses to compare some of it. */
function requireIdentifiers(params: Record<string, string | undefined>): void {
  for (const [name, value] of Object.entries(params)) if (name.endsWith("Id") && !isIdentifier(value)) notHere();
}
