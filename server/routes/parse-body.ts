import type { Request } from "express";
import type { z } from "zod";
import { wrongShape } from "../problems.ts";

/** The body as the schema has it, or a 422 that says what is wrong, field by field. */
export function parseBody<S extends z.ZodType>(schema: S, request: Request): z.output<S> {
  const parsed = schema.safeParse(request.body);
  if (!parsed.success) throw wrongShape(parsed.error);
  return parsed.data;
}
