// @vitest-environment node
import { describe, expect, it } from "vitest";
import { testPhone } from "../../../tests/helpers/phones/test-phone.ts";
import { changeLogbook } from "./change-logbook.ts";

const draft = { bikeId: "new", form: "bike", content: {}, savedAt: "2026-03-01T09:00:00Z" };

describe("a change of the logbook", () => {
  it("is there once it resolves", async () => {
    const phone = testPhone();
    await changeLogbook(phone, (change) => change.objectStore("drafts").add(draft));
    expect(await (await phone.open()).count("drafts")).toBe(1);
  });

  it("leaves nothing behind where its work fails half-way", async () => {
    const phone = testPhone();
    const failing = changeLogbook(phone, async (change) => {
      await change.objectStore("drafts").add(draft);
      throw new Error("half-way");
    });
    await expect(failing).rejects.toThrow("half-way");
    expect(await (await phone.open()).count("drafts")).toBe(0);
  });

  it("leaves nothing behind where it is aborted half-way", async () => {
    const phone = testPhone();
    const giveUp = new AbortController();
    const aborted = changeLogbook(
      phone,
      async (change) => {
        await change.objectStore("drafts").add(draft);
        giveUp.abort();
      },
      giveUp.signal,
    );
    await expect(aborted).rejects.toMatchObject({ name: "AbortError" });
    expect(await (await phone.open()).count("drafts")).toBe(0);
  });
});
