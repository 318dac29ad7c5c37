import { Cron } from "croner";
import { subDays } from "date-fns";
import type { Store } from "../db/store.ts";
import type { Logger } from "../log.ts";
import type { Mailer } from "../mail/mailer.ts";
import type { Services } from "../services/services.ts";

/** What was sent is remembered for so long, to be sent once. */
const MEMORY_DAYS = 400;

/** Runs `work` by the clock, and once at the start; never twice at once. */
function startJob(at: string, work: () => unknown, failed: (error: unknown) => void) {
  let running: Promise<void>;
  const run = () => {
    running = (async () => void (await work()))().catch(failed);
    return running;
  };
  const cron = new Cron(at, { protect: true }, run);
  const first = cron.trigger();
  return { stop: () => cron.stop(), settled: () => Promise.all([first, running]) };
}

interface Parts {
  services: Pick<Services, "mailAllDue">;
  store: Pick<Store, "mails">;
  mailer: Mailer;
  log: Logger;
}

/**
 * What the server does by the clock. What a stopped server missed, the next start catches up with;
 * what it had done stands in the database, so that none of it is done twice.
 */
export function startJobs({ services, store, mailer, log }: Parts) {
  const start = (job: string, at: string, work: () => unknown) =>
    startJob(at, work, (err) => log.error({ err, job }, "job failed"));
  const jobs = [
    start("remind-of-checks", "5 * * * *", () => services.mailAllDue()),
    start("send-mail", "* * * * *", () => mailer.sendDue()),
    start("forget-old-mail", "30 3 * * *", () =>
      store.mails.removeBefore(subDays(new Date(), MEMORY_DAYS).toISOString()),
    ),
  ];
  return {
    stop: () => jobs.forEach((job) => job.stop()),
    /** Resolves once nothing is under way. */
    settled: () => Promise.all(jobs.map((job) => job.settled())),
  };
}
