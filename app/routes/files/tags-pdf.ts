import { z } from "zod";
import { labelSheetByCode, labelSheets } from "#app/core/labels/label-sheets.ts";
import { tagPdf } from "#app/domain/tags/tag-pdf.server.ts";
import { boardsToTag, tagText } from "#app/domain/tags/tags.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { env } from "#app/services/env.server.ts";
import type { Route } from "./+types/tags-pdf.ts";

const asked = z.object({ sheet: z.string().catch(""), skip: z.coerce.number().int().min(0).max(200).catch(0) });

/** Tags of the asked boards as a PDF of exact size. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "tag:print");
  const { sheet: code, skip } = asked.parse(Object.fromEntries(url.searchParams));
  const sheet = labelSheetByCode(code) ?? labelSheetByCode(shop.labelSheet) ?? labelSheets[0];
  const boards = await boardsToTag(context.get(dbContext), actor, url.searchParams, shop);
  if (boards.length === 0 || !sheet) notHere();
  const pdf = await tagPdf(
    boards.map((board) => tagText(board, shop, env().PUBLIC_URL)),
    sheet,
    skip,
  );
  return new Response(Buffer.from(pdf), {
    headers: { "Content-Type": "application/pdf", "Content-Disposition": 'inline; filename="tags.pdf"' },
  });
}
