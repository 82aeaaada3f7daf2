import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { SelectField } from "#app/components/field.tsx";
import { Notice } from "#app/components/notice.tsx";
import { SureButton } from "#app/components/sure-button.tsx";
import { printDay } from "#app/components/when.tsx";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { type Invitation, listInvitations } from "#app/domain/people/invitations.sql.server.ts";
import { InviteForm } from "#app/domain/people/invite-form.tsx";
import { inviteForm } from "#app/domain/people/people.schema.ts";
import { changeMember, revokeInvitation } from "#app/domain/people/people.server.ts";
import { listMembers, type Member } from "#app/domain/people/people.sql.server.ts";
import { roles } from "#app/domain/shop/permissions.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireRole } from "#app/server/guards.server.ts";
import { askIn } from "#app/server/sign-in/ask-in.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/people.ts";

export { revalidateOnConflict as shouldRevalidate } from "#app/components/revalidate-on-conflict.ts";

const form = z.discriminatedUnion("intent", [
  inviteForm.extend({ intent: z.literal("invite") }),
  z.object({ intent: z.literal("revoke"), invitationId: z.string().regex(identifier) }),
  z.object({ intent: z.literal("role"), personId: z.string().regex(identifier), role: z.enum(roles) }),
  z.object({ intent: z.literal("remove"), personId: z.string().regex(identifier) }),
]);

const refusals = {
  member: { status: 409, words: "They are in the shop already." },
  limit: { status: 429, words: "That is enough invitations for one day." },
  unsent: { status: 503, words: "The letter could not be sent just now. Try again in a minute." },
};

export async function loader({ context, url }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "shop:people");
  const db = context.get(dbContext);
  const [members, invitations] = await Promise.all([
    listMembers(db, actor),
    listInvitations(db, actor, systemClock.now()),
  ]);
  return { members, invitations, me: actor.personId, sent: url.searchParams.has("sent") };
}

export async function action({ request, context }: Route.ActionArgs) {
  const atWork = requireRole(context, "shop:people");
  const db = context.get(dbContext);
  const submission = parseWithZod(await request.formData(), { schema: form });
  if (submission.status !== "success") return data({ invited: submission.reply(), keepsOwner: null }, { status: 400 });
  const asked = submission.value;
  if (asked.intent === "invite") {
    const result = await askIn(context, atWork, asked, systemClock.now());
    if (result.ok) return redirect(`${href("/people")}?sent`);
    const { status, words } = refusals[result.why];
    return data({ invited: submission.reply({ fieldErrors: { email: [words] } }), keepsOwner: null }, { status });
  }
  if (asked.intent === "revoke") {
    if (!(await revokeInvitation(db, atWork.actor, asked.invitationId))) notHere();
    return redirect(href("/people"));
  }
  const { personId } = asked;
  const changed = await changeMember(db, atWork.actor, personId, asked.intent === "role" ? asked.role : null);
  if (changed.ok) return redirect(href("/people"));
  if (changed.why === "missing") notHere();
  return data({ invited: undefined, keepsOwner: personId }, { status: 409 });
}

export default function People({ loaderData, actionData }: Route.ComponentProps) {
  const { members, invitations, me, sent } = loaderData;
  // Empty boxes again once an invitation is on its way.
  const round = invitations.map(({ id, expiresAt }) => `${id} ${expiresAt.getTime()}`).join();
  return (
    <>
      <PageHead title="People" lead="Who works here, and what each may do." />
      {sent && !actionData ? <Notice kind="good" title="The invitation is on its way" className="mb-4" /> : null}
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <Card title="In the shop">
          <ul className="divide-y divide-line">
            {members.map((member) => (
              <MemberRow
                key={member.personId}
                member={member}
                isMe={member.personId === me}
                keepsOwner={member.personId === actionData?.keepsOwner}
              />
            ))}
          </ul>
        </Card>
        <div className="grid gap-4">
          <Card title="Ask somebody in">
            <InviteForm key={round} lastResult={actionData?.invited} />
          </Card>
          {invitations.length > 0 ? (
            <Card title="Asked, not yet here">
              <ul className="divide-y divide-line">
                {invitations.map((invitation) => (
                  <InvitationRow key={invitation.id} invitation={invitation} />
                ))}
              </ul>
            </Card>
          ) : null}
        </div>
      </div>
    </>
  );
}

function InvitationRow({ invitation }: { invitation: Invitation }) {
  return (
    <li className="flex flex-wrap items-center justify-between gap-2 py-2">
      <span className="min-w-0 break-words">
        {invitation.email}{" "}
        <span className="text-ink-soft">
          as {invitation.role}, until {printDay(invitation.expiresAt)}
        </span>
      </span>
      <Form method="post">
        <input type="hidden" name="invitationId" value={invitation.id} />
        <Button
          look="quiet"
          name="intent"
          value="revoke"
          aria-label={`Take back the invitation of ${invitation.email}`}
        >
          Take back
        </Button>
      </Form>
    </li>
  );
}

interface MemberRowProps {
  member: Member;
  isMe: boolean;
  /** Was this person just refused to go, as the last owner? */
  keepsOwner: boolean;
}

function MemberRow({ member, isMe, keepsOwner }: MemberRowProps) {
  const who = member.name || member.email;
  return (
    <li className="grid gap-2 py-3">
      <div className="flex flex-wrap items-end justify-between gap-x-4 gap-y-2">
        <div className="min-w-0 break-words">
          <p className="font-semibold">
            {member.name || "No name given yet"}{" "}
            {isMe ? <span className="font-normal text-ink-soft">(you)</span> : null}
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
          <Button name="intent" value="role" aria-label={`Change the role of ${who}`}>
            Change
          </Button>
          <SureButton
            look="danger"
            sure="Press again to remove"
            name="intent"
            value="remove"
            aria-label={`Remove ${who} from the shop`}
          >
            Remove
          </SureButton>
        </Form>
      </div>
      {keepsOwner ? (
        <Notice kind="wrong" title="A shop keeps at least one owner. Make somebody else an owner first." />
      ) : null}
    </li>
  );
}
