export interface Message {
  subject: string;
  text: string;
  html: string;
  headers?: Record<string, string>;
}
