import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { config } from "zod";
import { App } from "./app/App";
import { announcePageNonce } from "./lib/pageNonce";
import "./styles.css";

announcePageNonce();
// The security policy allows no code made of text, and asking for it is reported as a breach.
config({ jitless: true });

createRoot(document.getElementById("root")!).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
