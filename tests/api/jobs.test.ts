import { subDays } from "date-fns";
import { expect, it, onTestFinished } from "vitest";
import { readConfig } from "../../server/config.ts";
import { createLog } from "../../server/log.ts";
import { startServer } from "../../server/start-server.ts";
import { startMailServer } from "../helpers/mail-server.ts";
import { bikeEntry, checkEntry, hoursEntry, newId } from "../helpers/make-entry.ts";
import { temporaryDir } from "../helpers/start-test-server.ts";

const daysAgo = (days: number) => subDays(new Date(), days).toISOString();

it("a starting server catches up with what was due while it stood, once, however often it starts", async () => {
  const mail = await startMailServer();
  const config = {
    ...readConfig({ PORT: "0", DATA_DIR: temporaryDir(), SMTP_URL: mail.smtpUrl }),
    hashCost: { memoryCost: 64, timeCost: 1, parallelism: 1 },
  };
  const start = () => startServer(config, createLog("silent"));

  const first = await start();
  onTestFinished(first.stop);
  const ann = { name: "Ann", email: "ann@club.example", password: "two strokes and a pump" };
  const { id } = await first.services.accounts.signUp(ann);
  const bikeId = newId();
  const entries = [
    bikeEntry(bikeId),
    checkEntry(bikeId, 12, 3, daysAgo(40)),
    hoursEntry(bikeId, 33, daysAgo(1)),
  ];
  first.services.sync(id, { known: {}, entries });
  first.store.users.markVerified(id);
  await first.stop();
  expect(mail.about("delivery check")).toEqual([]);

  for (const next of ["second", "third"]) {
    const server = await start();
    await server.stop();
    expect(mail.about("Moss: delivery check overdue"), next).toHaveLength(1);
    expect(mail.about("Confirm"), next).toHaveLength(1);
  }
});
