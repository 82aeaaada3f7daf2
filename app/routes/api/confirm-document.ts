import { data } from "react-router";
import { confirmDocument } from "#app/domain/deliveries/documents.server.ts";
import { dbContext, storageContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/confirm-document.ts";

/** Takes in a paper that was sent. A refused one answers 422 with why. */
export async function action({ params, context }: Route.ActionArgs) {
  const { actor } = requireRole(context, "delivery:receive");
  const result = await confirmDocument(context.get(dbContext), context.get(storageContext), actor, params.documentId);
  if (!result.ok && result.why === "missing") notHere();
  return data(result, { status: result.ok ? 200 : 422 });
}
