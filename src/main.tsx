import "@fontsource/merriweather/latin-400.css";
import "@fontsource/merriweather/latin-700.css";
import "@fontsource/merriweather/latin-900.css";
import "@fontsource/merriweather-sans/latin-400.css";
import "@fontsource/merriweather-sans/latin-600.css";
import "./index.css";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { Providers } from "./app/providers.tsx";
import { listenForMissingParts } from "./lib/missing-part.ts";

listenForMissingParts();

const root = document.getElementById("root");
if (root === null) throw new Error("index.html has no element #root");

createRoot(root).render(
  <StrictMode>
    <Providers />
  </StrictMode>,
);
