import type { Config } from "tailwindcss";

const token = (name: string): string => `var(--${name})`;

/** Gases whose colours are fixed; others take a hue by a rule in code. */
const gases = ["H", "H2", "He", "CH4", "O", "N2", "CO", "O2", "Ar", "CO2"] as const;

/**
 * Names for utilities. Values live in `src/styles.css` as custom properties, so that both lights and print share
 * one set. A spacing number is a pixel (`p-18` is 18 px); the steps in use are 4 8 12 18 28 44 64.
 */
export default {
  theme: {
    screens: { mid: "480px", wide: "1000px", margin: "1240px", full: "1424px" },
    colors: {
      transparent: "transparent",
      current: "currentColor",
      inherit: "inherit",
      paper: token("paper"),
      raised: token("raised"),
      sunk: token("sunk"),
      ink: token("ink"),
      ink2: token("ink2"),
      ink3: token("ink3"),
      rule: token("rule"),
      rule2: token("rule2"),
      airglow: token("airglow"),
      "airglow-wash": token("airglow-wash"),
      dusk: token("dusk"),
      "dusk-wash": token("dusk-wash"),
      sodium: token("sodium"),
      "sodium-wash": token("sodium-wash"),
      redline: token("redline"),
      "redline-wash": token("redline-wash"),
      ...Object.fromEntries(gases.map((gas) => [`g-${gas}`, token(`g-${gas}`)])),
    },
    fontFamily: { serif: token("serif"), sans: token("sans"), mono: token("mono") },
    borderRadius: { none: "0", DEFAULT: "2px" },
    boxShadow: { none: "none", float: "var(--shadow-float)" },
    transitionDuration: { DEFAULT: "120ms", wash: "120ms", mark: "180ms" },
    transitionTimingFunction: { DEFAULT: "ease-out" },
  },
} satisfies Config;
