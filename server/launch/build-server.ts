/* The second half of `npm run build`: the server as plain JavaScript in dist/server, for `node dist/server/main.js`.
   Packages stay outside and are taken from node_modules. */
import { build } from "vite";

await build({
  configFile: false,
  logLevel: "warn",
  publicDir: false,
  build: {
    ssr: true,
    target: "node20",
    outDir: "dist/server",
    emptyOutDir: true,
    sourcemap: true,
    minify: false,
    rolldownOptions: {
      input: { main: "server/main.ts", worker: "server/worker.ts", migrate: "server/db/migrate.ts" },
      output: { entryFileNames: "[name].js", chunkFileNames: "[name]-[hash].js" },
    },
  },
});
console.log("dist/server: main.js, worker.js, migrate.js");
