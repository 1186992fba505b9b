import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const styles = readFileSync(path.resolve(import.meta.dirname, "../../src/styles.css"), "utf8");

/** The two values of each token that is written as a plain pair of colours. */
const tokens = new Map(
  [...styles.matchAll(/--([\w-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\);/g)].map(
    ([, name, light, dark]) => [name!, [light!, dark!] as const],
  ),
);

/** Relative luminance and contrast by WCAG 2.2, definitions of "relative luminance" and "contrast ratio". */
function luminance(hex: string): number {
  const channel = (at: number) => {
    const value = parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}
function contrast(one: string, other: string): number {
  const [dark, light] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (light! + 0.05) / (dark! + 0.05);
}

const lights = [
  ["light", 0],
  ["dark", 1],
] as const;
const grounds = ["paper", "raised", "sunk", "dusk-wash"];
const texts = ["ink", "ink2", "ink3", "airglow", "dusk", "sodium", "redline"];
const gases = ["H", "H2", "He", "CH4", "O", "N2", "CO", "O2", "Ar", "CO2"];

describe.each(lights)("tokens on the %s page", (_, light) => {
  const value = (name: string) => {
    const pair = tokens.get(name);
    if (!pair) throw new Error(`No token --${name} in styles.css`);
    return pair[light];
  };

  it.each(texts)("--%s can be read on every ground, at least 4.5 to 1", (text) => {
    for (const ground of grounds) expect(contrast(value(text), value(ground))).toBeGreaterThanOrEqual(4.5);
  });

  it("--rule2 shows the edges of controls, at least 3 to 1 on paper", () => {
    expect(contrast(value("rule2"), value("paper"))).toBeGreaterThanOrEqual(3);
  });

  it("the main button's word can be read on it", () => {
    expect(contrast(value("paper"), value("airglow"))).toBeGreaterThanOrEqual(4.5);
  });

  it.each(gases)("the name of %s can be read in its colour, at least 4.5 to 1 on paper", (gas) => {
    expect(contrast(value(`g-${gas}`), value("paper"))).toBeGreaterThanOrEqual(4.5);
  });
});

it("forces either light on demand", () => {
  expect(styles).toMatch(/:root\[data-theme="light"\] \{\s*color-scheme: light;/);
  expect(styles).toMatch(/:root\[data-theme="dark"\] \{\s*color-scheme: dark;/);
});
