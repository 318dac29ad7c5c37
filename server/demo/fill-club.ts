import { v7 as uuid } from "uuid";
import type { Entry } from "../../shared/schemas/entry.ts";
import type { Store } from "../db/store.ts";
import type { Services } from "../services/services.ts";
import { entriesOf } from "./entries-of.ts";
import { DEMO_CLUB, DEMO_PASSWORD, demoRiders, type DemoRider } from "./invented-club.ts";

interface Parts {
  services: Services;
  store: Store;
}

function push({ services }: Parts, accountId: string, entries: Entry[]): void {
  const { results } = services.sync(accountId, { known: {}, entries });
  const refused = results.filter((result) => result.status !== "stored");
  if (refused.length > 0) throw new Error(`The demo was refused: ${JSON.stringify(refused)}`);
}

/** A rider's account, its address confirmed, with bikes and their logs. */
async function addRider(parts: Parts, { name, email, role, bikes }: DemoRider, now: Date) {
  const { id } = await parts.services.accounts.signUp({ name, email, password: DEMO_PASSWORD });
  parts.store.users.markVerified(id);
  const logs = bikes.map((bike) => {
    const bikeId = uuid();
    return { bikeId, shared: !bike.unshared, ...entriesOf(bike, bikeId, now) };
  });
  push(
    parts,
    id,
    logs.flatMap(({ byOwner }) => byOwner),
  );
  return { id, role, logs };
}

/** Makes the invented club as its people would: invited, joined, roles given, bikes shared. */
export async function fillClub(parts: Parts): Promise<void> {
  const { clubs, clubInvites, clubMembers, bikeShares, mailAllDue } = parts.services;
  const now = new Date();
  const riders = [];
  for (const rider of demoRiders) riders.push(await addRider(parts, rider, now));
  const organiser = riders.find(({ role }) => role === "organiser")!;
  const mechanic = riders.find(({ role }) => role === "mechanic")!;

  const club = clubs.add(organiser.id, DEMO_CLUB);
  const { url } = clubInvites.add(organiser.id, club.id, { uses: riders.length, days: 14 });
  const token = new URL(url).searchParams.get("token")!;
  for (const { id, logs } of riders) {
    clubInvites.accept(id, token);
    for (const { bikeId, shared } of logs) if (shared) bikeShares.share(id, bikeId, club.id);
  }
  clubMembers.setRoles(organiser.id, club.id, mechanic.id, { mechanic: true });
  const advice = riders.flatMap(({ logs }) => logs.flatMap(({ byMechanic }) => byMechanic));
  push(parts, mechanic.id, advice);
  await mailAllDue();
}
