import { randomUUID } from "node:crypto";
import { pinoHttp } from "pino-http";
import type { Logger } from "../log.ts";

/** Of a request only its method and path: queries may hold tokens, headers hold sessions, and of an
 * invite the path holds its token too. */
const request = ({ id, method, url }: { id: unknown; method: string; url: string }) => ({
  id,
  method,
  path: url.split("?")[0]?.replace(/(\/invites\/)[\w-]{22}(?=\/|$)/, "$1…"),
});

export const logRequests = (logger: Logger) =>
  pinoHttp({
    logger,
    genReqId(_request, response) {
      const id = randomUUID();
      response.setHeader("X-Request-Id", id);
      return id;
    },
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? "error" : "info"),
    autoLogging: { ignore: ({ url }) => url === "/api/health" },
    serializers: {
      req: request,
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
  });
