import "fake-indexeddb/auto";
import { expect, it } from "vitest";
import { forgetAccount, rememberAccount, rememberedAccount } from "./account.ts";
import { eraseFromPhone } from "./erase-from-phone.ts";
import { phoneOf } from "./logbook/phone.ts";

const account = (id: string) => ({ id, name: id, email: `${id}@club.example` });
const logbooks = async () =>
  (await indexedDB.databases()).map(({ name }) => name).filter((name) => name?.includes("logbook"));

it("takes one account's logbook and settings off the phone, and leaves the others'", async () => {
  const [ann, bob] = [account("ann"), account("bob")];
  for (const { id } of [ann, bob]) localStorage.setItem(`sumpless-read-${id}`, "{}");
  localStorage.setItem("sumpless-theme", "dark");
  for (const one of [ann, bob]) await phoneOf(one).open();
  rememberAccount(ann);

  await eraseFromPhone();
  expect(await logbooks()).toEqual(["sumpless-logbook-bob"]);
  expect(Object.keys(localStorage).sort()).toEqual(["sumpless-read-bob", "sumpless-theme"]);
  expect(rememberedAccount()).toBeNull();
});

it("takes a logbook off that a sync opens anew meanwhile", async () => {
  const ann = account("ann");
  rememberAccount(ann);
  const database = await phoneOf(ann).open();
  const opened = new Promise((resolve) => {
    database.addEventListener("versionchange", () => resolve(phoneOf(ann).open()));
  });
  await Promise.all([eraseFromPhone(), opened]);
  expect(await logbooks()).not.toContain("sumpless-logbook-ann");
});

it("does nothing where nobody is signed in", async () => {
  forgetAccount();
  await phoneOf(account("bob")).open();
  await eraseFromPhone();
  expect(await logbooks()).toContain("sumpless-logbook-bob");
});
