import { describe, expect, test } from "vitest";
import { anActor, aPerson } from "#tests/factories/shop.ts";
import { useTestDb } from "#tests/setup/test-db.ts";
import { listInvitations } from "./invitations.sql.server.ts";
import { acceptInvitation, changeMember, findInvitation, invite, openShop, revokeInvitation } from "./people.server.ts";
import { lastShopOf, listMembers, membershipOf, personByEmail } from "./people.sql.server.ts";
import { endSessionOf } from "./sessions.sql.server.ts";

const now = new Date("2027-03-01T09:00:00Z");
const later = (days: number) => new Date(now.getTime() + days * 86_400_000);

describe("people of a shop", () => {
  const db = useTestDb();

  async function invited(email = "new@shop.example", role: "maker" | "helper" | "owner" = "maker") {
    const owner = await anActor(db(), "owner");
    const result = await invite(db(), owner, email, role, now);
    if (!result.ok) throw new Error("not invited");
    return { owner, token: result.token };
  }

  test("whoever opens a shop owns it, and begins there", async () => {
    const person = await aPerson(db());
    const shopId = await openShop(db(), person.id, { name: "Bench end", units: "mm", currency: "EUR" });
    expect(await membershipOf(db(), person.id, shopId)).toEqual({ shopId, role: "owner" });
    expect(await lastShopOf(db(), person.id)).toBe(shopId);
  });

  test("an invitation brings its addressee in, in its role, once", async () => {
    const { owner, token } = await invited();
    const personId = await personByEmail(db(), "new@shop.example");
    const person = { personId, email: "new@shop.example" };
    expect(await acceptInvitation(db(), person, token, now)).toBe(owner.shopId);
    expect(await acceptInvitation(db(), person, token, now)).toBeNull();
    expect(await membershipOf(db(), personId, owner.shopId)).toMatchObject({ role: "maker" });
    expect(await listInvitations(db(), owner, now)).toEqual([]);
  });

  test("nobody else can use it, nor anybody after two weeks, nor after it is taken back or sent anew", async () => {
    const { owner, token } = await invited();
    const thief = await aPerson(db());
    expect(await acceptInvitation(db(), { personId: thief.id, email: thief.email }, token, now)).toBeNull();
    expect(await findInvitation(db(), token, later(15))).toBeNull();
    const again = await invite(db(), owner, "new@shop.example", "helper", now);
    expect(await findInvitation(db(), token, now)).toBeNull();
    if (!again.ok) throw new Error("not invited again");
    const [open] = await listInvitations(db(), owner, now);
    expect(open).toMatchObject({ email: "new@shop.example", role: "helper" });
    expect(await revokeInvitation(db(), await anActor(db(), "owner"), open?.id ?? "")).toBe(false);
    expect(await revokeInvitation(db(), owner, open?.id ?? "")).toBe(true);
    expect(await findInvitation(db(), again.token, now)).toBeNull();
  });

  test("somebody already in the shop is not asked in", async () => {
    const owner = await anActor(db(), "owner");
    const [member] = await listMembers(db(), owner);
    expect(await invite(db(), owner, member?.email ?? "", "helper", now)).toEqual({ ok: false, why: "member" });
  });

  test("a shop keeps an owner: the last one can neither step down nor be removed", async () => {
    const owner = await anActor(db(), "owner");
    const maker = await anActor(db(), "maker", { shopId: owner.shopId });
    expect(await changeMember(db(), owner, owner.personId, "maker")).toEqual({ ok: false, why: "last owner" });
    expect(await changeMember(db(), owner, owner.personId, null)).toEqual({ ok: false, why: "last owner" });
    expect(await changeMember(db(), owner, maker.personId, "owner")).toEqual({ ok: true });
    expect(await changeMember(db(), owner, owner.personId, null)).toEqual({ ok: true });
    expect(await membershipOf(db(), owner.personId, owner.shopId)).toBeNull();
  });

  test("people of another shop are not there", async () => {
    const owner = await anActor(db(), "owner");
    const stranger = await anActor(db(), "maker");
    expect(await changeMember(db(), owner, stranger.personId, "helper")).toEqual({ ok: false, why: "missing" });
    expect(await changeMember(db(), owner, stranger.personId, null)).toEqual({ ok: false, why: "missing" });
    expect((await listMembers(db(), owner)).map((member) => member.personId)).toEqual([owner.personId]);
  });

  test("a person ends only their own sessions", async () => {
    const [ana, ben] = [await aPerson(db()), await aPerson(db())];
    const session = { id: "aaaaaaaaaaaaa", secret_hash: "a".repeat(64), person_id: ana.id, expires_at: later(30) };
    await db()("sessions").insert(session);
    expect(await endSessionOf(db(), ben.id, session.id)).toBe(false);
    expect(await endSessionOf(db(), ana.id, session.id)).toBe(true);
  });
});
