import { answerOf, contentOf, type AnswerSchema } from "./api-client.ts";

/** Asks only for what is newer than the answer of this `etag`: null where that one still holds. */
export async function apiNewer<T>(
  path: string,
  schema: AnswerSchema<T>,
  etag: string | null,
): Promise<{ etag: string | null; content: T } | null> {
  const response = await answerOf(path, { etag });
  if (response.status === 304) return null;
  return { etag: response.headers.get("etag"), content: await contentOf(response, schema) };
}
