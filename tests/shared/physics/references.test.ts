import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";

import { codata2022 } from "../../../shared/physics/constants/codata2022";
import { iau } from "../../../shared/physics/constants/iau";
import { collisionRows } from "../../../shared/physics/handbook/collisionRows";
import { handbookBodies } from "../../../shared/physics/handbook/handbookBodies";
import { handbookGases } from "../../../shared/physics/handbook/handbookGases";
import { jeansCorrections } from "../../../shared/physics/handbook/jeansCorrections";
import { references } from "../../../shared/physics/references";

const root = join(import.meta.dirname, "../../../shared/physics");

/** Keys in square brackets from each `@source` on, to the end of its comment. */
function keysInDocstrings(): { file: string; key: string }[] {
  return readdirSync(root, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".ts"))
    .flatMap((file) => {
      const text = readFileSync(join(root, file), "utf8");
      return [...text.matchAll(/@source([\s\S]*?)\*\//g)].flatMap(([, tail]) =>
        [...tail.matchAll(/\[([A-Za-z]+\d*[A-Za-z]*\d*)\]/g)].map(([, key]) => ({ file, key })),
      );
    });
}

const provenances = [
  ...handbookGases.flatMap(({ sources }) => [
    ...sources.mass,
    sources.collisionDiameter,
    sources.thermalDiffusionFactor,
  ]),
  ...handbookBodies.flatMap(({ sources }) => Object.values(sources)),
  ...collisionRows.map(({ provenance }) => provenance),
  ...jeansCorrections.map(({ provenance }) => provenance),
];

describe("references", () => {
  it("hold the source of every constant", () => {
    for (const { name, source } of [...codata2022, ...iau]) expect(references, name).toHaveProperty([source]);
  });

  it("hold the source of every row of the handbook", () => {
    expect(provenances.length).toBeGreaterThan(200);
    for (const { source } of provenances) expect(references).toHaveProperty([source]);
  });

  it("hold every key that an @source line names", () => {
    const keys = keysInDocstrings();
    expect(keys.length).toBeGreaterThan(20);
    for (const { file, key } of keys) expect(references, `${file} names [${key}]`).toHaveProperty([key]);
  });

  it("say who, when and where", () => {
    for (const citation of Object.values(references)) {
      expect(citation).toMatch(/^\S.*\.$/);
      expect(citation.length).toBeGreaterThan(40);
    }
  });
});
