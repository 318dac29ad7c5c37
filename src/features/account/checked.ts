import type { z } from "zod";
import { errorsByField } from "../../../shared/schemas/errors-by-field.ts";
import { FieldErrors } from "../../ui/use-submit.ts";

/** What was typed, judged before it is sent, in the words the server uses. */
export function checked<T>(schema: z.ZodType<T>, typed: T): T {
  const parsed = schema.safeParse(typed);
  if (parsed.success) return parsed.data;
  throw new FieldErrors(errorsByField(parsed.error));
}
