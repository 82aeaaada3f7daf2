import { getFormProps, type SubmissionResult, useForm } from "@conform-to/react";
import { getZodConstraint, parseWithZod } from "@conform-to/zod/v4";
import { Form, useNavigation } from "react-router";
import { Button } from "#app/components/button.tsx";
import { TextArea, TextField } from "#app/components/field.tsx";
import { fieldProps } from "#app/components/form-field.ts";
import { supplierForm } from "./supplier.schema.ts";

interface SupplierFormFieldsProps {
  result: SubmissionResult<string[]> | undefined;
  supplier?: { name: string; email: string; phone: string; notes: string };
  /** The version the form was made from, where there is one. */
  version?: number;
  save: string;
  children?: React.ReactNode;
}

/** The form of a supplier, for adding one and for changing it. */
export function SupplierFields({ result, supplier, version, save, children }: SupplierFormFieldsProps) {
  const sending = useNavigation().state !== "idle";
  const [form, fields] = useForm({
    id: "supplier",
    lastResult: result,
    constraint: getZodConstraint(supplierForm),
    defaultValue: supplier,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: supplierForm }),
    shouldRevalidate: "onInput",
  });
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-4">
      {version === undefined ? null : <input type="hidden" name="version" value={version} />}
      <div className="grid gap-4 sm:grid-cols-2">
        <TextField label="Name" autoComplete="off" {...fieldProps(fields.name)} />
        <TextField
          label="E-mail"
          type="email"
          autoComplete="off"
          {...fieldProps(fields.email)}
          required={false}
          hint="Where questions about a delivery go."
        />
        <TextField label="Phone" type="tel" autoComplete="off" {...fieldProps(fields.phone)} required={false} />
        <TextArea
          label="Notes"
          {...fieldProps(fields.notes)}
          required={false}
          className="sm:col-span-2"
          hint="Who to ask for, opening hours, what they are good for."
        />
      </div>
      <div className="flex flex-wrap gap-3">
        <Button look="main" disabled={sending} className="w-full sm:w-auto">
          {save}
        </Button>
        {children}
      </div>
    </Form>
  );
}
