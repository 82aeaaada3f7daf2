import { data, Form, href, redirect } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { FrontDoor } from "#app/components/front-door.tsx";
import { Notice } from "#app/components/notice.tsx";
import { acceptInvitation, findInvitation } from "#app/domain/people/people.server.ts";
import { roleWords } from "#app/domain/people/role-words.ts";
import { dbContext, visitContext } from "#app/server/context.server.ts";
import { requireVisit } from "#app/server/guards.server.ts";
import { chooseShop } from "#app/server/session.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/invitation.ts";

export async function loader({ context, params }: Route.LoaderArgs) {
  const invitation = await findInvitation(context.get(dbContext), params.token, systemClock.now());
  const visit = context.get(visitContext);
  if (!invitation) return data({ found: null, signedInAs: visit?.email ?? null }, { status: 410 });
  const { shopName, email, role, invitedBy } = invitation;
  return { found: { shopName, email, role, invitedBy }, signedInAs: visit?.email ?? null };
}

export async function action({ context, params, url }: Route.ActionArgs) {
  const visit = requireVisit(context, url);
  const db = context.get(dbContext);
  const shopId = await acceptInvitation(db, visit, params.token, systemClock.now());
  if (!shopId) return data({ usedUp: true }, { status: 410 });
  await chooseShop(db, visit, shopId);
  return redirect(visit.personName ? href("/rack") : href("/account"));
}

export default function AcceptInvitation({ loaderData, actionData, params }: Route.ComponentProps) {
  const { found, signedInAs } = loaderData;
  if (!found || actionData?.usedUp)
    return (
      <FrontDoor title="That invitation is used up">
        <Notice kind="caution">
          It was accepted, taken back, or is older than two weeks. Ask whoever sent it for another.
        </Notice>
        <ButtonLink to={href("/rack")}>To your shop</ButtonLink>
      </FrontDoor>
    );
  const lead = `${found.invitedBy || "An owner"} asks ${found.email} in, as ${found.role}: ${roleWords[found.role]}.`;
  return (
    <FrontDoor title={found.shopName} lead={lead}>
      {signedInAs === found.email ? (
        <Form method="post">
          <Button look="main" className="min-h-14 w-full text-lg">
            Accept
          </Button>
        </Form>
      ) : signedInAs ? (
        <>
          <Notice kind="caution">
            You are signed in as {signedInAs}. Sign out, then open the invitation again as {found.email}.
          </Notice>
          <Form method="post" action={href("/sign-out")}>
            <Button look="main">Sign out</Button>
          </Form>
        </>
      ) : (
        <ButtonLink
          look="main"
          to={`${href("/sign-in")}?${new URLSearchParams({ to: href("/invitation/:token", { token: params.token }) })}`}
        >
          Sign in to accept
        </ButtonLink>
      )}
    </FrontDoor>
  );
}
