/**
 * Who may do what: the one table that every loader and action asks. The UI reads it too, to hide what would be refused, but hiding never decides.
 *
 * owner: everything. maker: deliveries, boards, projects, plans, own reservations; sees cost.
 * helper: scan, photograph, take readings, move, take down, count; no prices, no reservations for others, no deleting.
 */
export const roles = ["owner", "maker", "helper"] as const;
export type Role = (typeof roles)[number];

const everyone: readonly Role[] = ["owner", "maker", "helper"];
const makers: readonly Role[] = ["owner", "maker"];
const owners: readonly Role[] = ["owner"];

const table = {
  "board:see": everyone,
  "board:correct": makers,
  "board:move": everyone,
  "board:take-down": everyone,
  "board:delete": owners,
  "photo:add": everyone,
  "photo:remove": makers,
  "rings:read": everyone,
  "moisture:read": everyone,
  "cost:see": makers,
  "delivery:see": makers,
  "delivery:receive": makers,
  "delivery:tally": makers,
  "delivery:delete": owners,
  "supplier:see": makers,
  "supplier:change": makers,
  "project:see": everyone,
  "project:change": makers,
  "hold:place": makers,
  "hold:change-own": makers,
  "hold:change-any": owners,
  "tag:print": everyone,
  "rack:change": makers,
  "shop:settings": owners,
  "shop:people": owners,
  "shop:export": owners,
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof table;

/** Every permission there is, for tests that walk the whole table. */
export const permissions = Object.keys(table) as Permission[];

/** May somebody in this role do this? Client-safe. */
export function can(role: Role, permission: Permission): boolean {
  return table[permission].includes(role);
}
