export interface Message {
  subject: string;
  text: string;
  html: string;
  headers?: Record<string, string>;
}

/** A message on its way. Sent a second time by mischance, it bears the same id. */
export interface Letter {
  to: string;
  messageId: string;
  message: Message;
}
