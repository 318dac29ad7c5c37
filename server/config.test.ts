import path from "node:path";
import { describe, expect, it } from "vitest";
import { readConfig } from "./config.ts";

describe("readConfig", () => {
  it("needs no variable at all", () => {
    expect(readConfig({ SMTP_URL: "" })).toMatchObject({
      port: 3000,
      dataDir: path.resolve("data"),
      publicOrigin: "http://localhost:3000",
      trustedProxies: 0,
      smtpUrl: null,
    });
  });

  it("takes the public origin from the port unless told otherwise", () => {
    expect(readConfig({ PORT: "4100" }).publicOrigin).toBe("http://localhost:4100");
    const PUBLIC_ORIGIN = "https://logbook.example/";
    expect(readConfig({ PORT: "4100", PUBLIC_ORIGIN }).publicOrigin).toBe(
      "https://logbook.example",
    );
  });

  it("names every wrong variable", () => {
    const wrong = {
      PORT: "http",
      PUBLIC_ORIGIN: "https://logbook.example/app",
      TRUST_PROXY: "-1",
      SMTP_URL: "mail.example",
      LOG_LEVEL: "loud",
    };
    const read = () => readConfig(wrong);
    for (const name of Object.keys(wrong)) expect(read).toThrow(`  ${name} must be`);
  });

  it.each(["ftp://logbook.example", "logbook.example", "https://logbook.example/?a=1"])(
    "takes no public origin of %s",
    (PUBLIC_ORIGIN) => {
      expect(() => readConfig({ PUBLIC_ORIGIN })).toThrow("  PUBLIC_ORIGIN must be");
    },
  );
});
