import { data, Form, href } from "react-router";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { FrontDoor } from "#app/components/front-door.tsx";
import { Notice } from "#app/components/notice.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { addressOfLink, consumeLink } from "#app/server/sign-in/challenges.server.ts";
import { finishSignIn } from "#app/server/sign-in/finish.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/link.ts";

/** Only looks: programs that check mail open every link in it. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const token = url.searchParams.get("t") ?? "";
  const email = await addressOfLink(context.get(dbContext), token, systemClock.now());
  return data({ email, token, to: url.searchParams.get("to") ?? "/" }, { status: email ? 200 : 410 });
}

export async function action({ request, context }: Route.ActionArgs) {
  const db = context.get(dbContext);
  const now = systemClock.now();
  const form = await request.formData();
  const email = await consumeLink(db, String(form.get("t") ?? ""), now);
  if (!email) return data({ used: true }, { status: 410 });
  return finishSignIn(db, request, email, String(form.get("to") ?? "/"), now);
}

export default function SignInLink({ loaderData, actionData }: Route.ComponentProps) {
  const { email, token, to } = loaderData;
  if (!email || actionData)
    return (
      <FrontDoor title="That link is used up">
        <Notice kind="caution">A link is good for ten minutes, and once.</Notice>
        <ButtonLink look="main" to={href("/sign-in")}>
          Ask for another
        </ButtonLink>
      </FrontDoor>
    );
  return (
    <FrontDoor title="Sign in" lead={`As ${email}, on this device.`}>
      <Form method="post">
        <input type="hidden" name="t" value={token} />
        <input type="hidden" name="to" value={to} />
        <Button look="main" className="min-h-14 w-full text-lg">
          Sign in
        </Button>
      </Form>
    </FrontDoor>
  );
}
