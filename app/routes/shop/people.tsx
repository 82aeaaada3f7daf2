import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { Notice } from "#app/components/notice.tsx";
import { SureButton } from "#app/components/sure-button.tsx";
import { printDay } from "#app/components/when.tsx";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { inviteForm } from "#app/domain/people/people.schema.ts";
import { changeMember, invite, revokeInvitation } from "#app/domain/people/people.server.ts";
import { listInvitations, listMembers, type Member } from "#app/domain/people/people.sql.server.ts";
import { roles } from "#app/domain/shop/permissions.ts";
import { dbContext, mailerContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { invitationLetter } from "#app/server/sign-in/letters.server.ts";
import { mayInvite } from "#app/server/sign-in/limits.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import { env } from "#app/services/env.server.ts";
import type { Route } from "./+types/people.ts";

const form = z.discriminatedUnion("intent", [
  inviteForm.extend({ intent: z.literal("invite") }),
  z.object({ intent: z.literal("revoke"), invitationId: z.string().regex(identifier) }),
  z.object({ intent: z.literal("role"), personId: z.string().regex(identifier), role: z.enum(roles) }),
  z.object({ intent: z.literal("remove"), personId: z.string().regex(identifier) }),
]);

export async function loader({ context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "shop:people");
  const db = context.get(dbContext);
  const [members, invitations] = await Promise.all([
    listMembers(db, actor),
    listInvitations(db, actor, systemClock.now()),
  ]);
  return { members, invitations, me: actor.personId };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "shop:people");
  const db = context.get(dbContext);
  const now = systemClock.now();
  const parsed = form.safeParse(Object.fromEntries(await request.formData()));
  if (!parsed.success) return data({ why: parsed.error.issues[0]?.message ?? "" }, { status: 400 });
  const asked = parsed.data;
  if (asked.intent === "invite") {
    if (!(await mayInvite(db, actor.shopId, now)))
      return data({ why: "That is enough invitations for today." }, { status: 429 });
    const invited = await invite(db, actor, asked.email, asked.role, now);
    if (!invited.ok) return data({ why: `${asked.email} is in the shop already.` }, { status: 409 });
    const link = `${env().PUBLIC_URL}${href("/invitation/:token", { token: invited.token })}`;
    await context
      .get(mailerContext)
      .send(invitationLetter(asked.email, { by: actor.personName, shop: shop.name, role: asked.role, link }));
    return redirect(href("/people"));
  }
  if (asked.intent === "revoke") {
    if (!(await revokeInvitation(db, actor, asked.invitationId))) notHere();
    return redirect(href("/people"));
  }
  const changed = await changeMember(db, actor, asked.personId, asked.intent === "role" ? asked.role : null);
  if (!changed.ok && changed.why === "missing") notHere();
  if (!changed.ok)
    return data({ why: "A shop keeps at least one owner. Make somebody else an owner first." }, { status: 409 });
  return redirect(href("/people"));
}

export default function People({ loaderData, actionData }: Route.ComponentProps) {
  const { members, invitations, me } = loaderData;
  return (
    <>
      <PageHead title="People" lead="Who works here, and what each may do." />
      {actionData ? <Notice kind="wrong" title={actionData.why} className="mb-4" /> : null}
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <Card title="In the shop">
          <ul className="divide-y divide-line">
            {members.map((member) => (
              <MemberRow key={member.personId} member={member} isMe={member.personId === me} />
            ))}
          </ul>
        </Card>
        <div className="grid gap-4">
          <Card title="Ask somebody in">
            <Form method="post" className="grid gap-4">
              <TextField label="E-mail address" name="email" type="email" required />
              <SelectField label="As" name="role" defaultValue="maker">
                {roles.map((role) => (
                  <option key={role}>{role}</option>
                ))}
              </SelectField>
              <Button look="main" name="intent" value="invite">
                Send the invitation
              </Button>
            </Form>
          </Card>
          {invitations.length > 0 ? (
            <Card title="Asked, not yet here">
              <ul className="divide-y divide-line">
                {invitations.map((invitation) => (
                  <li key={invitation.id} className="flex flex-wrap items-center justify-between gap-2 py-2">
                    <span>
                      {invitation.email}{" "}
                      <span className="text-ink-soft">
                        as {invitation.role}, until {printDay(invitation.expiresAt)}
                      </span>
                    </span>
                    <Form method="post">
                      <input type="hidden" name="invitationId" value={invitation.id} />
                      <Button look="quiet" name="intent" value="revoke">
                        Take back
                      </Button>
                    </Form>
                  </li>
                ))}
              </ul>
            </Card>
          ) : null}
        </div>
      </div>
    </>
  );
}

function MemberRow({ member, isMe }: { member: Member; isMe: boolean }) {
  return (
    <li className="flex flex-wrap items-end justify-between gap-x-4 gap-y-2 py-3">
      <div>
        <p className="font-semibold">
          {member.name || "No name given yet"} {isMe ? <span className="font-normal text-ink-soft">(you)</span> : null}
        </p>
        <p className="text-ink-soft">{member.email}</p>
      </div>
      <Form method="post" className="flex flex-wrap items-end gap-2">
        <input type="hidden" name="personId" value={member.personId} />
        <SelectField label="Role" name="role" defaultValue={member.role} key={member.role}>
          {roles.map((role) => (
            <option key={role}>{role}</option>
          ))}
        </SelectField>
        <Button name="intent" value="role">
          Change
        </Button>
        <SureButton
          look="danger"
          sure="Press again to remove"
          name="intent"
          value="remove"
          aria-label={`Remove ${member.name || member.email} from the shop`}
        >
          Remove
        </SureButton>
      </Form>
    </li>
  );
}
