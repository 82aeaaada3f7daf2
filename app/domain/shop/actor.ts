import { can, type Permission, type Role } from "./permissions.ts";

/** The signed-in person at work in one shop. Every use case takes one, so that no query exists without its shop. */
export interface Actor {
  personId: string;
  personName: string;
  shopId: string;
  role: Role;
}

/** May this person do this in the shop they are in? */
export function actorCan(actor: Actor, permission: Permission): boolean {
  return can(actor.role, permission);
}
