import { pino, type Logger } from "pino";

export type { Logger };

/** Lines of JSON to stdout. Nothing logs a header, a body, a query or an address of a person. */
export const createLog = (level: string): Logger => pino({ level, base: null });
