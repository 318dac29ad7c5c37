import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import path from "node:path";
import { defineConfig } from "vite";
import { VitePWA } from "vite-plugin-pwa";

export default defineConfig({
  build: {
    outDir: "dist/client",
    target: "es2022",
    sourcemap: false,
    // Browsers without modulepreload load the same files, only later.
    modulePreload: { polyfill: false },
    rolldownOptions: {
      output: {
        // What the first load needs of libraries in one file: it packs better than in slices, and
        // stays the same from one version of the app to the next.
        codeSplitting: {
          groups: [
            {
              name: "libraries",
              test: /node_modules\/(react|react-dom|react-router|react-router-dom|scheduler|@tanstack\/[^/]*query[^/]*|idb)\//,
            },
          ],
        },
      },
    },
  },
  resolve: {
    // Its package names only the build with a developer's warnings.
    alias: [
      {
        find: /^react-router$/,
        replacement: path.resolve("node_modules/react-router/dist/production/index.mjs"),
      },
    ],
  },
  server: { proxy: { "/api": "http://localhost:3000" } },
  plugins: [
    react(),
    tailwindcss(),
    VitePWA({
      strategies: "injectManifest",
      srcDir: "src",
      filename: "sw.ts",
      registerType: "prompt",
      injectRegister: false,
      injectManifest: {
        globPatterns: ["**/*.{js,css,html,woff2,svg,png,webmanifest}"],
        rollupFormat: "iife",
      },
      manifest: {
        id: "/",
        name: "Sumpless",
        short_name: "Sumpless",
        description: "The logbook that tells you the oil pump is still keeping up.",
        start_url: "/",
        scope: "/",
        display: "standalone",
        background_color: "#F7F4EC",
        theme_color: "#F7F4EC",
        icons: [
          { src: "/icon-192.png", sizes: "192x192", type: "image/png" },
          { src: "/icon-512.png", sizes: "512x512", type: "image/png" },
          {
            src: "/icon-maskable-512.png",
            sizes: "512x512",
            type: "image/png",
            purpose: "maskable",
          },
        ],
      },
    }),
  ],
});
