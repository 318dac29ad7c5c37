import type { Request } from "express";
import type { z } from "zod";
import { wrongShape } from "../problems.ts";

/** What was sent as the schema has it, or a 422 that says what is wrong, field by field. */
export function parseShape<S extends z.ZodType>(schema: S, sent: unknown): z.output<S> {
  const parsed = schema.safeParse(sent);
  if (!parsed.success) throw wrongShape(parsed.error);
  return parsed.data;
}

export const parseBody = <S extends z.ZodType>(schema: S, request: Request): z.output<S> =>
  parseShape(schema, request.body);
