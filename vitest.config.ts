import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const setupFiles = ["tests/helpers/fail-on-console.ts"];

/** A machine under load is slow, not wrong. */
const patience = {
  testTimeout: 60_000,
  hookTimeout: 60_000,
  expect: { poll: { timeout: 15_000 } },
};

export default defineConfig({
  test: {
    maxWorkers: "100%",
    projects: [
      {
        test: {
          ...patience,
          name: "core",
          environment: "node",
          // Pure functions have nothing to keep apart.
          isolate: false,
          include: ["shared/**/*.test.ts", "tests/reference/**/*.test.ts"],
          setupFiles,
        },
      },
      {
        test: {
          ...patience,
          name: "node",
          environment: "node",
          include: ["{server,scripts}/**/*.test.ts", "tests/api/**/*.test.ts"],
          setupFiles,
        },
      },
      {
        plugins: [react()],
        // The router's CommonJS entry asks for an ES module, which `vmForks` cannot give it.
        resolve: {
          alias: {
            "react-router-dom": `${import.meta.dirname}/node_modules/react-router-dom/dist/index.mjs`,
          },
        },
        test: {
          ...patience,
          name: "client",
          environment: "jsdom",
          // jsdom itself is loaded once, not for each file; not threads, which have no TZ of their own.
          pool: "vmForks",
          include: ["src/**/*.test.{ts,tsx}"],
          setupFiles: [...setupFiles, "tests/helpers/client-setup.ts"],
        },
      },
    ],
  },
});
