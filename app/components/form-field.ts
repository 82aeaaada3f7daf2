import type { FieldMetadata } from "@conform-to/react";

/**
 * What a Field component needs of one Conform field: identity, what was typed or is kept, and what is wrong with it.
 * Nothing typed is lost on a refused form, with or without JavaScript.
 */
export function fieldProps(field: FieldMetadata<unknown>): {
  id: string;
  name: string;
  defaultValue: string;
  errors: string[] | undefined;
  required: boolean | undefined;
} {
  return {
    id: field.id,
    name: field.name,
    defaultValue: field.initialValue === undefined || field.initialValue === null ? "" : String(field.initialValue),
    errors: field.errors,
    required: field.required,
  };
}
