import type { Request } from "express";

export type SecurityEvent =
  | "signed-up"
  | "signed-in"
  | "signed-out"
  | "password-reset-asked"
  | "password-reset"
  | "password-changed"
  | "email-change-asked"
  | "email-confirmed"
  | "device-ended"
  | "other-devices-ended"
  | "data-exported"
  | "account-erased";

/** What happened to an account, by its id: never an address, never a secret. */
export const logEvent = (request: Request, event: SecurityEvent, accountId?: string) =>
  request.log.info({ event, accountId }, "account event");
