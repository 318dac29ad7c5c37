import { z } from "zod";

/** RFC 9457 problem details, as every error of the API is answered. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  errors: z.record(z.string(), z.string()).optional(),
});

export type Problem = z.infer<typeof problemSchema>;
