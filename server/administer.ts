import { parseArgs } from "node:util";
import { AdministrationError, type Administration } from "./services/administration.ts";

const USAGE = `npm run admin -- <what to do>

  reset-link <e-mail>            prints a link to choose a new password: once, for 30 minutes
  end-sessions <e-mail>          signs the account out on every device
  end-sessions --all             signs everyone out
  delete-account <e-mail> --yes  erases the account, its bikes and their logs, for good
  list-clubs                     prints each club, its size and its organisers' addresses`;

const usage = () => new AdministrationError(USAGE);

function listClubs(admin: Administration): string {
  const clubs = admin.listClubs();
  if (clubs.length === 0) return "There are no clubs.";
  const line = (club: (typeof clubs)[number]) =>
    `${club.name} · since ${club.createdAt.slice(0, 10)} · ${club.members} members · ${club.organisers.join(", ")}`;
  return clubs.map(line).join("\n");
}

function endSessions(admin: Administration, email: string | undefined, all: boolean): string {
  if (all === (email !== undefined)) throw usage();
  if (email !== undefined) return `Sessions ended: ${admin.endSessions(email)}`;
  admin.endAllSessions();
  return "Everyone is signed out.";
}

function deleteAccount(admin: Administration, email: string, yes: boolean): string {
  if (!yes) throw new AdministrationError("Nothing erased: this is for good, so say --yes too.");
  admin.deleteAccount(email);
  return `The account of ${email} and its bikes are erased.`;
}

/** Does what the operator typed, and answers what to print. */
export function administer(admin: Administration, args: string[]): string {
  const options = { all: { type: "boolean" }, yes: { type: "boolean" } } as const;
  const { values, positionals } = parseArgs({ args, options, allowPositionals: true });
  const [what, email, ...more] = positionals;
  if (more.length > 0) throw usage();
  if (what === "list-clubs") return listClubs(admin);
  if (what === "end-sessions") return endSessions(admin, email, values.all ?? false);
  if (email === undefined) throw usage();
  if (what === "reset-link") return admin.resetLink(email);
  if (what === "delete-account") return deleteAccount(admin, email, values.yes ?? false);
  throw usage();
}
