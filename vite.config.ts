import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vite";

export default defineConfig({
  plugins: [react(), tailwindcss()],
  resolve: { alias: { "@": `${import.meta.dirname}/src`, "#shared": `${import.meta.dirname}/shared` } },
  build: { outDir: "dist/client", sourcemap: true, target: "es2022", chunkSizeWarningLimit: 700 },
});
