/** `GET` and `PUT /api/account/reminders`, and what an unsubscribe link sends. */
import { z } from "zod";

/** Which mails an account gets; all are sent until it says otherwise. */
export const remindersSchema = z.strictObject({
  /** A check due soon or overdue: at most one a week and bike. */
  dueMails: z.boolean("Say whether to send them."),
  /** *Stop*, judged or advised, on one's own bike or, to a mechanic, on one shared with the club. */
  stopMails: z.boolean("Say whether to send them."),
});
export const remindersResponseSchema = z.object({ reminders: remindersSchema });

export type Reminders = z.infer<typeof remindersSchema>;
