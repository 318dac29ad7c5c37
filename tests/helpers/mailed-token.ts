import { expect, vi } from "vitest";
import type { TestServer } from "./start-test-server.ts";

/** The newest mail of this subject, once it is there. */
export async function newestMail(server: TestServer, subject: string): Promise<string> {
  await vi.waitFor(() => expect(server.mails().join()).toContain(`Subject: ${subject}`));
  return server.mails().findLast((text) => text.includes(`Subject: ${subject}`))!;
}

/** The token of the link in it. */
export async function mailedToken(server: TestServer, subject: string): Promise<string> {
  return /#token=([\w-]+)/.exec(await newestMail(server, subject))![1]!;
}
