import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const setupFiles = ["tests/helpers/fail-on-console.ts"];

export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: "node",
          environment: "node",
          include: ["{shared,server,scripts}/**/*.test.ts", "tests/{api,reference}/**/*.test.ts"],
          setupFiles,
        },
      },
      {
        plugins: [react()],
        test: {
          name: "client",
          environment: "jsdom",
          include: ["src/**/*.test.{ts,tsx}"],
          setupFiles: [...setupFiles, "tests/helpers/client-setup.ts"],
        },
      },
    ],
  },
});
