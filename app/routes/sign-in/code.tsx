import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, href, Link, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { FrontDoor } from "#app/components/front-door.tsx";
import { codeForm } from "#app/domain/people/people.schema.ts";
import { dbContext, mailerContext } from "#app/server/context.server.ts";
import { judgeCode } from "#app/server/sign-in/authenticator.server.ts";
import { countAttempt } from "#app/server/sign-in/challenges.server.ts";
import { mayGuess } from "#app/server/sign-in/limits.server.ts";
import { readPending } from "#app/server/sign-in/pending.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/code.ts";

export async function loader({ request }: Route.LoaderArgs) {
  const pending = await readPending(request);
  if (!pending) throw redirect(href("/sign-in"));
  return { email: pending.email };
}

const wrong = "That code is not right, or it is used up. Look at the newest letter; after five tries ask for another.";
const tooMany = {
  place: "Too many codes were tried from here. Open the link in the letter, or wait a quarter of an hour.",
  address: "Too many codes were tried for this address today. Open the link in the letter instead.",
};

export async function action({ request, context }: Route.ActionArgs) {
  const db = context.get(dbContext);
  const now = systemClock.now();
  const submission = parseWithZod(await request.formData(), { schema: codeForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const refuse = (why: string, status: number) =>
    data({ result: submission.reply({ fieldErrors: { code: [why] } }) }, { status });
  const pending = await readPending(request);
  if (!pending) return refuse(wrong, 400);
  const may = await mayGuess(db, request, pending.email, now);
  if (may !== "yes") return refuse(tooMany[may], 429);
  if (!(await countAttempt(db, pending.challengeId, now))) return refuse(wrong, 400);
  const answer = await judgeCode({ db, mailer: context.get(mailerContext), now }, request, submission.value.code);
  return answer.headers.get("Location")?.startsWith("/sign-in/code") ? refuse(wrong, 400) : answer;
}

export default function TypeCode({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(codeForm),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: codeForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <FrontDoor
      title="Type the code"
      lead={`A letter with six digits is on its way to ${loaderData.email}. It is good for ten minutes.`}
    >
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <TextField
          label="Code"
          inputMode="numeric"
          autoComplete="one-time-code"
          autoFocus
          {...fieldProps(fields.code)}
        />
        <Button look="main" className="min-h-14 text-lg">
          Sign in
        </Button>
      </Form>
      <p>
        <Link to={href("/sign-in")} className="inline-flex min-h-11 items-center text-link underline">
          Another address, or another code
        </Link>
      </p>
    </FrontDoor>
  );
}
