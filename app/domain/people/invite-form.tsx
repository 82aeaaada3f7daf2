import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form } from "react-router";
import { Button } from "#app/components/button.tsx";
import { SelectField, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { Notice } from "#app/components/notice.tsx";
import { roles } from "#app/domain/shop/permissions.ts";
import { inviteForm } from "./people.schema.ts";
import { roleWords } from "./role-words.ts";

/** Asks somebody into the shop; posts to the page it stands on, with the intent "invite". */
export function InviteForm({ lastResult }: { lastResult: SubmissionResult<string[]> | undefined }) {
  const [form, fields] = useForm({
    id: "invite",
    lastResult,
    constraint: getZodConstraint(inviteForm),
    defaultValue: { email: "", role: "maker" },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: inviteForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-4">
      <input type="hidden" name="intent" value="invite" />
      <TextField label="E-mail address" type="email" autoComplete="off" {...fieldProps(fields.email)} />
      <SelectField label="As" {...fieldProps(fields.role)}>
        {roles.map((role) => (
          <option key={role}>{role}</option>
        ))}
      </SelectField>
      <dl className="grid gap-1 text-sm">
        {roles.map((role) => (
          <div key={role}>
            <dt className="inline font-semibold">{role}: </dt>
            <dd className="inline text-ink-soft">{roleWords[role]}</dd>
          </div>
        ))}
      </dl>
      {form.errors ? <Notice kind="wrong" title={form.errors.join(" ")} /> : null}
      <Button look="main">Send the invitation</Button>
    </Form>
  );
}
