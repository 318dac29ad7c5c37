import { addDays, subDays } from "date-fns";
import { afterEach, describe, expect, it, vi } from "vitest";
import supertest from "supertest";
import { mailedPages } from "../../shared/schemas/mailed-pages.ts";
import { linkIn, startMailServer } from "../helpers/mail-server.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  strikeEntry,
  workEntry,
} from "../helpers/make-entry.ts";
import { createPhone, signUpRider, type Rider } from "../helpers/rider.ts";
import { startTestServer, type TestServer } from "../helpers/start-test-server.ts";

afterEach(() => {
  vi.useRealTimers();
});

const daysAgo = (days: number) => subDays(new Date(), days).toISOString();
const pass = (days: number) =>
  vi.useFakeTimers({ toFake: ["Date"], now: addDays(new Date(), days) });

/** A server that mails, and a rider whose address is confirmed. */
async function confirmedRider(name = "Ann") {
  const mail = await startMailServer();
  const server = await startTestServer({ smtpUrl: mail.smtpUrl });
  const rider = await signUpRider(server, name);
  server.store.users.markVerified(rider.user.id);
  /** What the hourly job does. */
  const remind = async () => {
    await server.services.mailAllDue();
    await server.mailer.sendDue();
    return mail.about("delivery check");
  };
  return { server, rider, mail, remind };
}

/** A bike checked at 12.0 h, 40 days ago, with a likely next check after 20 h. */
async function addBike(rider: Rider, hoursSince: number, name = "Moss") {
  const bikeId = newId();
  await rider.sync([
    bikeEntry(bikeId, { name }),
    checkEntry(bikeId, 12, 3, daysAgo(40)),
    hoursEntry(bikeId, 12 + hoursSince, daysAgo(1)),
  ]);
  return bikeId;
}

describe("a reminder", () => {
  it("is sent when the hours are nearly over, with what is known and the way to the bike", async () => {
    const { rider, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    const [letter] = await remind();
    expect(letter!.to).toEqual([rider.user.email]);
    expect(letter!.headers.subject).toBe("Moss: delivery check due soon");
    expect(letter!.words).toMatch(
      /4\.0 engine hours are left, by the reading of \d+ \w+ 20\d\d\. As the bike is ridden, it falls due about \d/,
    );
    expect(letter!.text).toContain(`http://localhost:3000/bikes/${bikeId}`);
    expect(letter!.html).toContain(`href="http://localhost:3000/bikes/${bikeId}"`);
  });

  it("is sent for the likely date too, where the hours alone would not tell", async () => {
    const { rider, remind } = await confirmedRider();
    // 12 h in 39 days: the 8 that are left of 20 last about 26 days.
    await addBike(rider, 12);
    expect(await remind()).toEqual([]);
    pass(20);
    const [letter] = await remind();
    expect(letter!.headers.subject).toBe("Moss: delivery check due soon");
    pass(10);
    const [, overdue] = await remind();
    expect(overdue!.headers.subject).toBe("Moss: delivery check overdue");
  });

  it("comes once when it is due soon and once when it is overdue, at most one a week", async () => {
    const { rider, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    await remind();
    expect(await remind()).toHaveLength(1);
    await rider.sync([hoursEntry(bikeId, 33, daysAgo(0))]);
    expect(await remind()).toHaveLength(1);
    pass(8);
    const letters = await remind();
    expect(letters.map(({ headers }) => headers.subject)).toEqual([
      "Moss: delivery check due soon",
      "Moss: delivery check overdue",
    ]);
    expect(letters[1]!.words).toContain("It is 1.0 engine hours over");
    pass(30);
    expect(await remind()).toHaveLength(2);
  });

  it("leaves a week's quiet after one that the mail server took late", async () => {
    const { rider, mail, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    mail.state.busy = true;
    await remind();
    mail.state.busy = false;
    pass(6);
    expect(await remind()).toHaveLength(1);
    await rider.sync([hoursEntry(bikeId, 33, daysAgo(0))]);
    pass(2);
    expect(await remind()).toHaveLength(1);
    pass(6);
    expect(await remind()).toHaveLength(2);
  });

  it("begins anew after the next check", async () => {
    const { rider, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    await remind();
    await rider.sync([checkEntry(bikeId, 29, 3, daysAgo(0))]);
    pass(60);
    await rider.sync([hoursEntry(bikeId, 47, daysAgo(0))]);
    expect(await remind()).toHaveLength(2);
  });

  it("is one for each bike", async () => {
    const { rider, remind } = await confirmedRider();
    await addBike(rider, 16, "Moss");
    await addBike(rider, 21, "Fern");
    const subjects = (await remind()).map(({ headers }) => headers.subject).sort();
    expect(subjects).toEqual(["Fern: delivery check overdue", "Moss: delivery check due soon"]);
  });

  it("is not sent of a bike never checked, retired, or far from its check", async () => {
    const { rider, remind } = await confirmedRider();
    const [unchecked, retired] = [newId(), await addBike(rider, 21)];
    await rider.sync([bikeEntry(unchecked), hoursEntry(unchecked, 30, daysAgo(1))]);
    await rider.sync([bikeEntry(retired, { retired: true })]);
    await addBike(rider, 2);
    expect(await remind()).toEqual([]);
  });

  it("is sent of the first check that work on the pump asks for", async () => {
    const { rider, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 2);
    const work = workEntry(bikeId, 14, ["pump-renewed"]);
    await rider.sync([{ ...work, at: daysAgo(0), body: { ...work.body, startsSeries: true } }]);
    const [letter] = await remind();
    expect(letter!.words).toContain("There is no check of this baseline yet.");
  });

  it("goes only to addresses that were confirmed", async () => {
    const { server, mail, remind } = await confirmedRider();
    await addBike(await signUpRider(server, "Bob"), 21);
    await remind();
    expect(mail.about("Moss")).toEqual([]);
  });

  it.each([
    ["checked", (bikeId: string) => checkEntry(bikeId, 29, 3, daysAgo(0))],
    ["retired", (bikeId: string) => bikeEntry(bikeId, { retired: true })],
    ["given a longer interval", (bikeId: string) => bikeEntry(bikeId, { intervalHours: 40 })],
  ])("is not sent once its bike was %s while it waited", async (_, entry) => {
    const { rider, mail, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    mail.state.busy = true;
    await remind();
    await rider.sync([entry(bikeId)]);
    mail.state.busy = false;
    pass(1);
    expect(await remind()).toEqual([]);
  });

  it("is not sent of hours that were struck while it waited", async () => {
    const { rider, mail, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 2);
    const typo = hoursEntry(bikeId, 29, daysAgo(0));
    await rider.sync([typo]);
    mail.state.busy = true;
    await remind();
    await rider.sync([strikeEntry(bikeId, typo.id)]);
    mail.state.busy = false;
    pass(1);
    expect(await remind()).toEqual([]);
  });

  it("says overdue where the check became so while it waited", async () => {
    const { rider, mail, remind } = await confirmedRider();
    const bikeId = await addBike(rider, 16);
    mail.state.busy = true;
    await remind();
    await rider.sync([hoursEntry(bikeId, 33, daysAgo(0))]);
    mail.state.busy = false;
    pass(1);
    const subjects = (await remind()).map(({ headers }) => headers.subject);
    expect(subjects).toEqual(["Moss: delivery check overdue"]);
  });

  it("is not sent to who turned reminders off while it waited", async () => {
    const { server, rider, mail, remind } = await confirmedRider();
    await addBike(rider, 16);
    mail.state.busy = true;
    await remind();
    const wanted = { dueMails: false, stopMails: true };
    await rider.phone.put("/api/account/reminders").send(wanted).expect(200);
    mail.state.busy = false;
    pass(1);
    await server.mailer.sendDue();
    expect(mail.about("delivery check")).toEqual([]);
  });

  it("is sent once, though servers stop and start between", async () => {
    const { server, rider, mail } = await confirmedRider();
    await addBike(rider, 21);
    mail.state.busy = true;
    await server.services.mailAllDue();
    await server.stop();
    mail.state.busy = false;
    pass(1);
    for (const start of ["second", "third"]) {
      const next = await startTestServer({ smtpUrl: mail.smtpUrl, dataDir: server.dataDir });
      await next.services.mailAllDue();
      await next.mailer.sendDue();
      await next.stop();
      expect(mail.about("delivery check"), start).toHaveLength(1);
    }
  });
});

describe("the settings", () => {
  it("are all on until the account says otherwise", async () => {
    const { rider, remind } = await confirmedRider();
    await addBike(rider, 21);
    const path = "/api/account/reminders";
    expect((await rider.phone.get(path)).body).toEqual({
      reminders: { dueMails: true, stopMails: true },
    });
    const wanted = { dueMails: false, stopMails: true };
    await rider.phone.put(path).send(wanted).expect(200, { reminders: wanted });
    expect((await rider.phone.get(path)).body).toEqual({ reminders: wanted });
    expect(await remind()).toEqual([]);
    await rider.phone.put(path).send({ dueMails: true }).expect(422);
  });
});

describe("unsubscribing", () => {
  async function reminded() {
    const { rider, server, remind } = await confirmedRider();
    await addBike(rider, 21);
    const [letter] = await remind();
    const reminders = async () => (await rider.phone.get("/api/account/reminders")).body as unknown;
    return { server, rider, letter: letter!, reminders };
  }

  const oneClickOf = (headers: Record<string, string>, { url }: TestServer) => {
    const { pathname, search } = new URL(headers["list-unsubscribe"]!.replace(/^<|>$/g, ""));
    return url + pathname + search;
  };

  it.each(["application/x-www-form-urlencoded", "multipart/form-data; boundary=x"])(
    "is one click in the mail program, with no session and no Origin, sent as %s",
    async (type) => {
      const { server, letter, reminders } = await reminded();
      expect(letter.headers["list-unsubscribe-post"]).toBe("List-Unsubscribe=One-Click");
      for (const click of ["first", "again"]) {
        const answer = await supertest(oneClickOf(letter.headers, server))
          .post("")
          .set("Content-Type", type)
          .send("List-Unsubscribe=One-Click");
        expect(answer.status, click).toBe(204);
      }
      expect(await reminders()).toEqual({ reminders: { dueMails: false, stopMails: true } });
    },
  );

  it("is a page's button for who follows the link in the letter", async () => {
    const { server, letter, reminders } = await reminded();
    const link = linkIn(letter, mailedPages.unsubscribe);
    expect(letter.html).toContain(link);
    const token = new URLSearchParams(link.split("?")[1]).get("token");
    await createPhone(server).post(`/api/unsubscribe?token=${token}`).expect(204);
    expect(await reminders()).toMatchObject({ reminders: { dueMails: false } });
  });

  it("does not happen to who, or what, only looks at the link", async () => {
    const { server, letter, reminders } = await reminded();
    await supertest(oneClickOf(letter.headers, server)).get("").expect(404);
    expect(await reminders()).toMatchObject({ reminders: { dueMails: true } });
  });

  it("takes no token that was tampered with, or of an account that is no more", async () => {
    const { server, rider, letter, reminders } = await reminded();
    const click = oneClickOf(letter.headers, server);
    const token = new URL(click).searchParams.get("token")!;
    const changed = (token.startsWith("A") ? "B" : "A") + token.slice(1);
    for (const forged of [changed, `${token}A`, token.slice(0, 20), "A", "no token"]) {
      const path = `/api/unsubscribe?token=${encodeURIComponent(forged)}`;
      await createPhone(server).post(path).expect(404);
    }
    expect(await reminders()).toMatchObject({ reminders: { dueMails: true } });
    server.services.eraseBike(rider.user.id, server.store.bikes.idsOf(rider.user.id)[0]!);
    server.database.$client.exec("DELETE FROM mails; DELETE FROM reminders; DELETE FROM sessions");
    server.store.users.remove(rider.user.id);
    await supertest(click).post("").expect(404);
  });
});
