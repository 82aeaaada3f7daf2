import type { Role } from "#app/domain/shop/permissions.ts";

/** What each role may, in a line, for whoever gives one or is asked in. The table that decides is app/domain/shop/permissions.ts. */
export const roleWords: Record<Role, string> = {
  owner: "everything: people, prices, settings, deleting",
  maker: "deliveries, boards, projects, own reservations; sees what wood cost",
  helper: "scans, photographs, reads rings and moisture, moves boards and takes them down; sees no prices",
};
