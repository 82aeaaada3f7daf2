import { getFormProps, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { data, Form, redirect } from "react-router";
import { Button } from "#app/components/button.tsx";
import { TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { FrontDoor } from "#app/components/front-door.tsx";
import { signInForm } from "#app/domain/people/people.schema.ts";
import { dbContext, logContext, mailerContext, visitContext } from "#app/server/context.server.ts";
import { mailCode } from "#app/server/sign-in/authenticator.server.ts";
import { mayMail } from "#app/server/sign-in/limits.server.ts";
import { localPath } from "#app/server/sign-in/pending.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/sign-in.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  const to = localPath(url.searchParams.get("to"));
  if (context.get(visitContext)) throw redirect(to);
  return { to };
}

export async function action({ request, context }: Route.ActionArgs) {
  const submission = parseWithZod(await request.formData(), { schema: signInForm });
  if (submission.status !== "success") return data({ result: submission.reply() }, { status: 400 });
  const { email, to } = submission.value;
  const services = { db: context.get(dbContext), mailer: context.get(mailerContext), now: systemClock.now() };
  if (!(await mayMail(services.db, request, email, services.now))) {
    const formErrors = ["Too many codes were asked for. Use the newest letter, or wait a quarter of an hour."];
    return data({ result: submission.reply({ formErrors }) }, { status: 429 });
  }
  try {
    return await mailCode(services, request, email, localPath(to));
  } catch (error) {
    context.get(logContext).error({ err: error }, "a sign-in letter could not be sent");
    return data(
      { result: submission.reply({ formErrors: ["The letter could not be sent just now. Try again in a minute."] }) },
      { status: 503 },
    );
  }
}

export default function SignIn({ loaderData, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData?.result,
    constraint: getZodConstraint(signInForm),
    onValidate: ({ formData }) => parseWithZod(formData, { schema: signInForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <FrontDoor
      title="Sign in"
      lead="A code comes by e-mail; there is no password. The first time, it opens a shop of your own."
    >
      <Form method="post" {...getFormProps(form)} className="grid gap-4">
        <input type="hidden" name="to" value={loaderData.to} />
        <TextField
          label="Your e-mail address"
          type="email"
          autoComplete="email"
          autoFocus
          {...fieldProps(fields.email)}
        />
        {form.errors ? (
          <p role="alert" className="font-semibold text-wrong">
            {form.errors.join(" ")}
          </p>
        ) : null}
        <Button look="main" className="min-h-14 text-lg">
          Send the code
        </Button>
      </Form>
    </FrontDoor>
  );
}
