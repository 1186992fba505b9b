/** Compares `docs/validation.md` with what the tests of `shared` have just found, or writes it. */
import { readdirSync, readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { format, resolveConfig } from "prettier";
import type { TestModule } from "vitest/node";

import { sectionOf } from "./agreement";
import { type TestedLaw, testedLaws } from "./testedLaws";
import { type SectionedAgreement, validationPage } from "./validationPage";

const root = path.resolve(import.meta.dirname, "../..");
const page = path.join(root, "docs/validation.md");

/**
 * What is wrong with the page after this run, or null. Only a run in which every test of `shared` passed can tell; after
 * any other the page is left alone. With `TENUITY_VALIDATION=write` it is written instead.
 */
export async function checkValidation(modules: readonly TestModule[]): Promise<string | null> {
  const isWriting = process.env.TENUITY_VALIDATION === "write";
  const ran = modules.filter(({ project }) => project.name === "shared");
  if (!isWhole(ran)) {
    return isWriting ? "docs/validation.md is not written: not every test of shared passed." : null;
  }
  const missing = testedLaws.find((one) => !isTested(one, ran));
  if (missing)
    return `docs/validation.md promises what no test holds: "${missing.law}". There is no test "${missing.test}" in tests/shared/${missing.file}.`;
  const text = await format(validationPage(agreementsOf(ran)), {
    ...(await resolveConfig(page)),
    parser: "markdown",
  });
  if (isWriting) {
    writeFileSync(page, text);
    return null;
  }
  return readPage() === text
    ? null
    : "docs/validation.md is out of date: it differs from what the tests find. Write it anew with npm run validation, and look at what changed.";
}

function readPage(): string | null {
  try {
    return readFileSync(page, "utf8");
  } catch {
    return null;
  }
}

function isWhole(modules: readonly TestModule[]): boolean {
  const tests = path.join(root, "tests/shared");
  const files = readdirSync(tests, { recursive: true, encoding: "utf8" })
    .filter((file) => file.endsWith(".test.ts"))
    .map((file) => path.join(tests, file));
  const ran = new Set(modules.map(({ moduleId }) => moduleId));
  return (
    files.every((file) => ran.has(file)) &&
    modules.every((module) =>
      [...module.children.allTests()].every((test) => test.result().state === "passed"),
    )
  );
}

const isTested = ({ file, test }: TestedLaw, modules: readonly TestModule[]): boolean =>
  modules.some(
    (module) =>
      module.moduleId === path.join(root, "tests/shared", file) &&
      [...module.children.allTests()].some(({ name }) => name.includes(test)),
  );

function agreementsOf(modules: readonly TestModule[]): SectionedAgreement[] {
  return [...modules]
    .sort((a, b) => (a.moduleId < b.moduleId ? -1 : 1))
    .flatMap((module) =>
      [...module.children.allTests()].flatMap((test) =>
        (test.meta().agreements ?? []).map((row) => ({
          section: row.section ?? sectionOf(module.moduleId),
          row,
        })),
      ),
    );
}
