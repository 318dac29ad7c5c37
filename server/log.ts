import { pino, type DestinationStream, type Logger } from "pino";

export type { Logger };

/** Lines of JSON. Nothing logs a header, a body, a query or an address of a person. */
export const createLog = (level: string, to?: DestinationStream): Logger =>
  pino({ level, base: null }, to ?? pino.destination(1));
