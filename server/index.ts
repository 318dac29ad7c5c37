import { ConfigError, readConfig } from "./config.ts";
import { createLog } from "./log.ts";
import { startServer } from "./start-server.ts";

try {
  const config = readConfig(process.env);
  const log = createLog(config.logLevel);
  const server = await startServer(config, log);
  log.info({ port: server.port, origin: config.publicOrigin }, "listening");

  for (const signal of ["SIGTERM", "SIGINT"] as const) {
    process.once(signal, () => {
      log.info({ signal }, "stopping");
      void server.stop().then(() => {
        log.info("stopped");
        process.exit();
      });
    });
  }
} catch (error) {
  console.error(error instanceof ConfigError ? error.message : error);
  process.exitCode = 1;
}
