import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { FrontDoor } from "#app/components/front-door.tsx";
import { When } from "#app/components/when.tsx";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { deviceName } from "#app/domain/people/device-name.ts";
import { nameForm } from "#app/domain/people/people.schema.ts";
import { renamePerson } from "#app/domain/people/people.sql.server.ts";
import { endOtherSessions, endSessionOf, type OwnSession, sessionsOf } from "#app/domain/people/sessions.sql.server.ts";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireVisit } from "#app/server/guards.server.ts";
import { keepTheme, readTheme } from "#app/server/theme.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/account.ts";

const form = z.discriminatedUnion("intent", [
  nameForm,
  z.object({ intent: z.literal("light"), theme: z.enum(["light", "dark", "system"]) }),
  z.object({ intent: z.literal("end"), sessionId: z.string().regex(identifier) }),
  z.object({ intent: z.literal("end others") }),
]);

export async function loader({ request, context, url }: Route.LoaderArgs) {
  const visit = requireVisit(context, url);
  const sessions = await sessionsOf(context.get(dbContext), visit.personId, systemClock.now());
  return {
    name: visit.personName,
    email: visit.email,
    here: visit.sessionId,
    sessions,
    theme: (await readTheme(request)) ?? "system",
  };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const visit = requireVisit(context, url);
  const db = context.get(dbContext);
  const submission = parseWithZod(await request.formData(), { schema: form });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const asked = submission.value;
  if (asked.intent === "light")
    return redirect(href("/account"), { headers: { "Set-Cookie": await keepTheme(asked.theme) } });
  if (asked.intent === "name") await renamePerson(db, visit.personId, asked.name);
  else if (asked.intent === "end others") await endOtherSessions(db, visit.personId, visit.sessionId);
  else if (!(await endSessionOf(db, visit.personId, asked.sessionId))) notHere();
  return redirect(href("/account"));
}

export default function Account({ loaderData, actionData }: Route.ComponentProps) {
  const { name, email, here, sessions, theme } = loaderData;
  return (
    <FrontDoor title="Your account" lead={email}>
      <NameForm name={name} lastResult={actionData?.result} />
      <Form method="post" className="flex items-end gap-3">
        <SelectField label="Light of the shop" name="theme" defaultValue={theme} className="flex-1">
          <option value="system">as this device says</option>
          <option value="light">light</option>
          <option value="dark">dim</option>
        </SelectField>
        <Button name="intent" value="light">
          Save
        </Button>
      </Form>
      <section>
        <h2 className="mb-2 text-xl">Where you are signed in</h2>
        <ul className="divide-y divide-line rounded-xl border border-line bg-surface">
          {sessions.map((session) => (
            <SessionRow key={session.id} session={session} isHere={session.id === here} />
          ))}
        </ul>
        <div className="mt-3 flex flex-wrap gap-2">
          {sessions.length > 1 ? (
            <Form method="post">
              <Button name="intent" value="end others">
                End all others
              </Button>
            </Form>
          ) : null}
          <Form method="post" action={href("/sign-out")}>
            <Button>Sign out here</Button>
          </Form>
          <ButtonLink look="quiet" to={href("/rack")}>
            Back to the rack
          </ButtonLink>
        </div>
      </section>
    </FrontDoor>
  );
}

function NameForm({ name, lastResult }: { name: string; lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm({
    id: "name",
    lastResult,
    defaultValue: { name },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: nameForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <Form method="post" {...getFormProps(form)} className="flex items-start gap-3">
      <input type="hidden" name="intent" value="name" />
      <TextField label="What people call you" autoComplete="name" className="flex-1" {...fieldProps(fields.name)} />
      <Button className="mt-6">Save</Button>
    </Form>
  );
}

function SessionRow({ session, isHere }: { session: OwnSession; isHere: boolean }) {
  const device = deviceName(session.userAgent);
  return (
    <li className="flex items-center justify-between gap-3 px-4 py-3">
      <span>
        <strong className="block">{device}</strong>
        <span className="text-ink-soft text-sm">
          last used <When at={session.lastSeenAt} />
        </span>
      </span>
      {isHere ? (
        <span className="text-ink-soft">here</span>
      ) : (
        <Form method="post">
          <input type="hidden" name="sessionId" value={session.id} />
          <Button name="intent" value="end" aria-label={`End ${device}`}>
            End
          </Button>
        </Form>
      )}
    </li>
  );
}
