import { subDays } from "date-fns";
import { describe, expect, it } from "vitest";
import { clubOfFour, giveRoles, share, withdraw } from "../helpers/club.ts";
import { linkIn, startMailServer } from "../helpers/mail-server.ts";
import {
  bikeEntry,
  checkEntry,
  hoursEntry,
  newId,
  noteEntry,
  strikeEntry,
} from "../helpers/make-entry.ts";
import { PASSWORD, type Rider } from "../helpers/rider.ts";
import { startTestServer } from "../helpers/start-test-server.ts";

const daysAgo = (days: number) => subDays(new Date(), days).toISOString();

/** A club whose addresses are confirmed, and a shared bike of Ann's whose delivery held at 12.0 h. */
async function clubThatIsMailed() {
  const mail = await startMailServer();
  const server = await startTestServer({ smtpUrl: mail.smtpUrl });
  const four = await clubOfFour(server);
  const { owner, mechanic, organiser, member, club } = four;
  for (const { user } of [owner, mechanic, organiser, member])
    server.store.users.markVerified(user.id);
  const bikeId = newId();
  await owner.sync([bikeEntry(bikeId, { name: "Fern" }), checkEntry(bikeId, 12, 3, daysAgo(40))]);
  await share(owner, bikeId, club.id);
  /** Who was mailed that Fern's delivery is low, since the server started. */
  const told = async () => {
    await server.mailer.sendDue();
    return mail.about("Fern: delivery low").flatMap(({ to }) => to).sort(); // prettier-ignore
  };
  /** Who was mailed that somebody advises to stop riding Fern. */
  const advised = async () => {
    await server.mailer.sendDue();
    return mail.about("Fern: stop advised").flatMap(({ to }) => to).sort(); // prettier-ignore
  };
  const findLow = (who: Rider, days = 0) => who.sync([checkEntry(bikeId, 32, 2.4, daysAgo(days))]);
  /** The mail server takes nothing while something happens; then all that waits is to be sent. */
  async function outage(happens: () => Promise<unknown>): Promise<void> {
    mail.state.busy = true;
    await happens();
    mail.state.busy = false;
    server.database.$client.exec("UPDATE mails SET next_attempt_at = 0 WHERE letter IS NOT NULL");
  }
  return { ...four, server, mail, bikeId, told, advised, findLow, outage };
}

const emails = (...riders: Rider[]) => riders.map(({ user }) => user.email).sort();

describe("a delivery judged low", () => {
  it("by the mechanic's check is told to the owner, by the owner's to the mechanic", async () => {
    const byMechanic = await clubThatIsMailed();
    await byMechanic.findLow(byMechanic.mechanic);
    expect(await byMechanic.told()).toEqual(emails(byMechanic.owner));
    const byOwner = await clubThatIsMailed();
    await byOwner.findLow(byOwner.owner);
    expect(await byOwner.told()).toEqual(emails(byOwner.mechanic));
  });

  it("is told with who found it, whose bike it is, and the way to it", async () => {
    const { organiser, member, club, mechanic, mail, bikeId, findLow, told } =
      await clubThatIsMailed();
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    await findLow(mechanic);
    await told();
    const letters = mail.about("Fern: delivery low");
    expect(letters).toHaveLength(2);
    const toOwner = letters.find(({ words }) => !words.includes("the bike of"))!;
    const toMechanic = letters.find((letter) => letter !== toOwner)!;
    expect(toMechanic.words).toContain("Fern, the bike of Ann, is judged low");
    for (const letter of letters) {
      expect(letter.words).toMatch(
        /an entry by Mick.* at 80 % of its baseline\. Stop, find the cause\./,
      );
      expect(linkIn(letter, "/bikes/")).toBe(`/bikes/${bikeId}`);
      expect(letter.headers["list-unsubscribe-post"]).toBe("List-Unsubscribe=One-Click");
      expect(letter.text).not.toContain("@");
    }
  });

  it("is told once a session, whatever else is written, and again of the next session", async () => {
    const { owner, mechanic, bikeId, told, findLow } = await clubThatIsMailed();
    await findLow(owner);
    await owner.sync([noteEntry(bikeId), checkEntry(bikeId, 32.5, 2.4, daysAgo(0))]);
    await owner.sync([hoursEntry(bikeId, 32.8, daysAgo(0))]);
    expect(await told()).toEqual(emails(mechanic));
    await owner.sync([checkEntry(bikeId, 35, 2.4, daysAgo(0))]);
    expect(await told()).toEqual(emails(mechanic, mechanic));
  });

  it("is told to nobody who does not want it, has not confirmed, or may not see the bike", async () => {
    const { server, owner, mechanic, organiser, member, club, bikeId, told, findLow } =
      await clubThatIsMailed();
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    server.database.$client
      .prepare("UPDATE users SET verified = 0 WHERE id = ?")
      .run(member.user.id);
    const wanted = { dueMails: true, stopMails: false };
    await mechanic.phone.put("/api/account/reminders").send(wanted).expect(200);
    await findLow(owner);
    expect(await told()).toEqual([]);
    await mechanic.phone
      .put("/api/account/reminders")
      .send({ ...wanted, stopMails: true })
      .expect(200);
    await withdraw(owner, bikeId, club.id);
    await owner.sync([checkEntry(bikeId, 35, 2.4, daysAgo(0))]);
    expect(await told()).toEqual([]);
  });

  it("is not told to whom the bike was withdrawn from before the mail could be sent", async () => {
    const { owner, bikeId, club, told, findLow, outage } = await clubThatIsMailed();
    await outage(async () => {
      await findLow(owner);
      expect(await told()).toEqual([]);
      await withdraw(owner, bikeId, club.id);
    });
    expect(await told()).toEqual([]);
  });

  it("is not told to who turned such mails off before the mail could be sent", async () => {
    const { organiser, owner, mechanic, member, club, told, findLow, outage } =
      await clubThatIsMailed();
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    await outage(async () => {
      await findLow(owner);
      expect(await told()).toEqual([]);
      const wanted = { dueMails: true, stopMails: false };
      await mechanic.phone.put("/api/account/reminders").send(wanted).expect(200);
    });
    expect(await told()).toEqual(emails(member));
  });

  it("goes to the address that its reader has by the time it can be sent", async () => {
    const { server, owner, mechanic, told, findLow, outage } = await clubThatIsMailed();
    await outage(async () => {
      await findLow(owner);
      expect(await told()).toEqual([]);
      server.store.users.setEmail(mechanic.user.id, "mick@new.example");
    });
    expect(await told()).toEqual(["mick@new.example"]);
  });

  it("is told once a session, though the check it was told of is struck", async () => {
    const { owner, mechanic, bikeId, told } = await clubThatIsMailed();
    const low = (hours: number) => checkEntry(bikeId, hours, 2.4, daysAgo(0));
    const [first, second] = [low(32), low(32.5)];
    await owner.sync([first]);
    await owner.sync([second]);
    await owner.sync([strikeEntry(bikeId, first.id)]);
    expect(await told()).toEqual(emails(mechanic));
    await owner.sync([strikeEntry(bikeId, second.id)]);
    await owner.sync([low(32.8)]);
    expect(await told()).toEqual(emails(mechanic, mechanic));
  });

  it.each(["struck", "repeated and held", "followed by a check that holds"])(
    "is not told where it was %s before the mail could be sent",
    async (how) => {
      const { owner, bikeId, told, outage } = await clubThatIsMailed();
      const low = checkEntry(bikeId, 32, 2.4, daysAgo(2));
      await outage(async () => {
        await owner.sync([low]);
        expect(await told()).toEqual([]);
        await owner.sync([
          how === "struck"
            ? strikeEntry(bikeId, low.id)
            : checkEntry(bikeId, how.startsWith("repeated") ? 32.5 : 34, 3.2, daysAgo(1)),
        ]);
      });
      expect(await told()).toEqual([]);
    },
  );

  it("is told by the mail that waits where another low check of the session stands", async () => {
    const { owner, mechanic, bikeId, told, outage } = await clubThatIsMailed();
    const [first, second] = [32, 32.5].map((at) => checkEntry(bikeId, at, 2.4, daysAgo(0)));
    await outage(async () => {
      await owner.sync([first, second]);
      expect(await told()).toEqual([]);
      await owner.sync([strikeEntry(bikeId, first!.id)]);
    });
    expect(await told()).toEqual(emails(mechanic));
  });

  it("is not told to who found it, whatever others write after", async () => {
    const { owner, mechanic, bikeId, told, findLow } = await clubThatIsMailed();
    await findLow(mechanic, 1);
    await owner.sync([hoursEntry(bikeId, 32.5, daysAgo(0))]);
    expect(await told()).toEqual(emails(owner));
  });

  it("is told under the name of who found it, though another's entry made it stand", async () => {
    const { owner, mechanic, mail, bikeId, told, findLow } = await clubThatIsMailed();
    const held = checkEntry(bikeId, 32, 3.2, daysAgo(1));
    await owner.sync([held]);
    await findLow(mechanic);
    expect(await told()).toEqual([]);
    await owner.sync([strikeEntry(bikeId, held.id)]);
    expect(await told()).toEqual(emails(owner));
    expect(mail.about("Fern: delivery low")[0]!.words).toContain("After an entry by Mick,");
  });

  it("in a mechanic's check is told to the owner, however late it comes", async () => {
    const { owner, mechanic, told, findLow } = await clubThatIsMailed();
    await findLow(mechanic, 20);
    expect(await told()).toEqual(emails(owner));
  });

  it("in a check that the owner copied from an old book is no news", async () => {
    const { owner, told, findLow } = await clubThatIsMailed();
    await findLow(owner, 20);
    expect(await told()).toEqual([]);
  });

  it("leaves no mail behind when its bike or its reader's account is erased", async () => {
    const { server, owner, mechanic, bikeId, findLow } = await clubThatIsMailed();
    await findLow(owner);
    await findLow(mechanic);
    await owner.phone.delete(`/api/bikes/${bikeId}`).expect(204);
    await mechanic.phone.delete("/api/account").send({ password: PASSWORD }).expect(204);
    const left = server.database.$client.prepare("SELECT count(*) FROM mails WHERE topic = 'stop'");
    expect(left.pluck().get()).toBe(0);
  });
});

describe("a stop that somebody wrote", () => {
  const advice = (bikeId: string, words: "ride" | "stop" = "stop", days = 0) => ({
    ...noteEntry(bikeId, "Hose is <cracked> at the clip", words),
    at: daysAgo(days),
  });

  it("is told to the owner and the other mechanics, with its words, and not to its author", async () => {
    const { organiser, mechanic, owner, member, club, mail, bikeId, advised } =
      await clubThatIsMailed();
    await giveRoles(organiser, club.id, member, { mechanic: true }).expect(200);
    await mechanic.sync([advice(bikeId)]);
    expect(await advised()).toEqual(emails(owner, member));
    const letters = mail.about("Fern: stop advised");
    const toOwner = letters.find(({ to }) => to.includes(owner.user.email))!;
    const toMember = letters.find((letter) => letter !== toOwner)!;
    expect(toOwner.words).toContain("Mick advises to stop riding Fern, and wrote:");
    expect(toMember.words).toContain("Mick advises to stop riding Fern, the bike of Ann, and");
    for (const letter of letters) {
      expect(letter.words).toContain("Hose is <cracked> at the clip");
      expect(letter.html).toContain("Hose is &lt;cracked&gt; at the clip");
      expect(linkIn(letter, "/bikes/")).toBe(`/bikes/${bikeId}`);
      expect(letter.text).not.toContain("@");
    }
  });

  it("is told once for each note, whatever else is written, and by whom", async () => {
    const { owner, mechanic, bikeId, advised } = await clubThatIsMailed();
    const note = advice(bikeId);
    await mechanic.sync([note]);
    expect(await advised()).toEqual(emails(owner));
    await mechanic.sync([note, hoursEntry(bikeId, 13, daysAgo(0))]);
    await owner.sync([checkEntry(bikeId, 14, 3, daysAgo(0))]);
    expect(await advised()).toEqual(emails(owner));
    await mechanic.sync([advice(bikeId)]);
    expect(await advised()).toEqual(emails(owner, owner));
  });

  it("is told beside a delivery judged low, each for itself", async () => {
    const { owner, mechanic, bikeId, findLow, told, advised } = await clubThatIsMailed();
    await findLow(mechanic);
    await mechanic.sync([advice(bikeId)]);
    expect(await told()).toEqual(emails(owner));
    expect(await advised()).toEqual(emails(owner));
  });

  it.each(["lifted", "struck"])("is not told where it was %s in the same call", async (how) => {
    const { mechanic, bikeId, advised } = await clubThatIsMailed();
    const note = advice(bikeId, "stop", 1);
    const end = how === "lifted" ? advice(bikeId, "ride") : strikeEntry(bikeId, note.id);
    await mechanic.sync([note, end]);
    expect(await advised()).toEqual([]);
  });

  it.each(["lifted", "struck"])(
    "is not told where it was %s before the mail could be sent, and again once it stands",
    async (how) => {
      const { owner, mechanic, bikeId, advised, outage } = await clubThatIsMailed();
      const note = advice(bikeId, "stop", 1);
      const end = how === "lifted" ? advice(bikeId, "ride") : strikeEntry(bikeId, note.id);
      await outage(async () => {
        await mechanic.sync([note]);
        expect(await advised()).toEqual([]);
        await owner.sync([end]);
      });
      expect(await advised()).toEqual([]);
      if (how === "lifted") await owner.sync([strikeEntry(bikeId, end.id)]);
      else await mechanic.sync([advice(bikeId)]);
      expect(await advised()).toEqual(emails(owner));
    },
  );

  it.each([
    ["weeks late", daysAgo(20)],
    ["of a phone whose clock says 1970", "1970-01-01T00:00:09.000Z"],
  ])("in a mechanic's note %s is told to the owner", async (_, at) => {
    const { owner, mechanic, bikeId, advised } = await clubThatIsMailed();
    await mechanic.sync([{ ...advice(bikeId), at }]);
    expect(await advised()).toEqual(emails(owner));
  });

  it("and copied by the owner from an old book, or another advice, is told to nobody", async () => {
    const { mechanic, owner, bikeId, advised } = await clubThatIsMailed();
    await owner.sync([advice(bikeId, "stop", 20)]);
    await mechanic.sync([advice(bikeId, "ride")]);
    expect(await advised()).toEqual([]);
  });

  it("is told to nobody who does not want such mails, or may no longer see the bike", async () => {
    const { owner, mechanic, club, bikeId, advised } = await clubThatIsMailed();
    const wanted = { dueMails: true, stopMails: false };
    await owner.phone.put("/api/account/reminders").send(wanted).expect(200);
    await mechanic.sync([advice(bikeId)]);
    await withdraw(owner, bikeId, club.id);
    await owner.sync([advice(bikeId)]);
    expect(await advised()).toEqual([]);
  });
});
