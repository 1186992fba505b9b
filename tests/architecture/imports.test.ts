import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

/** One room of the house: where it is, which rooms it may reach besides itself, which packages it may use. */
interface Room {
  name: string;
  holds: RegExp;
  mayImport: string[];
  npm: RegExp | "any" | "none";
}

/** First match wins, so a room inside a room comes before it. */
const rooms: Room[] = [
  { name: "physics", holds: /^shared\/physics\//, mayImport: [], npm: "none" },
  {
    name: "notebook",
    holds: /^shared\/notebook\//,
    mayImport: ["physics"],
    npm: /^(zod|@lezer\/.+|mdast-util-from-markdown|mdast)$/,
  },
  { name: "schemas", holds: /^shared\/schemas\//, mayImport: ["physics", "notebook"], npm: /^zod$/ },
  {
    name: "server/db",
    holds: /^server\/db\//,
    mayImport: ["physics", "notebook", "schemas"],
    npm: /^(drizzle-orm(\/.+)?|@electric-sql\/pglite(\/.+)?|pg|node:.+)$/,
  },
  { name: "server/policies", holds: /^server\/policies\//, mayImport: ["schemas"], npm: "none" },
  {
    name: "server/presenters",
    holds: /^server\/presenters\//,
    mayImport: ["physics", "notebook", "schemas", "server/db", "server/policies"],
    npm: "any",
  },
  {
    name: "server/errors",
    holds: /^server\/errors\.ts$/,
    mayImport: ["schemas"],
    npm: "any",
  },
  {
    name: "server/commands",
    holds: /^server\/commands\//,
    mayImport: ["physics", "notebook", "schemas", "server/db", "server/errors"],
    npm: "any",
  },
  {
    name: "server",
    holds: /^server\//,
    mayImport: [
      "physics",
      "notebook",
      "schemas",
      "server/db",
      "server/policies",
      "server/presenters",
      "server/commands",
      "server/errors",
    ],
    npm: "any",
  },
  { name: "src/lib", holds: /^src\/lib\//, mayImport: ["physics", "notebook", "schemas"], npm: "any" },
  {
    name: "src/ui",
    holds: /^src\/ui\//,
    mayImport: ["physics", "notebook", "schemas", "src/lib"],
    npm: "any",
  },
  {
    name: "src/features",
    holds: /^src\/features\//,
    mayImport: ["physics", "notebook", "schemas", "src/lib", "src/ui"],
    npm: "any",
  },
  {
    name: "src/app",
    holds: /^src\/(app\/|main\.tsx$|styles\.css$)/,
    mayImport: ["physics", "notebook", "schemas", "src/lib", "src/ui", "src/features"],
    npm: "any",
  },
];

const root = path.resolve(import.meta.dirname, "../..");
const roomOf = (file: string): Room | undefined => rooms.find((room) => room.holds.test(file));
const featureOf = (file: string): string | undefined => /^src\/features\/([^/]+)\//.exec(file)?.[1];

const importPattern =
  /(?:^|[\s;])(?:import|export)\s[^;"']*?from\s*["']([^"']+)["']|(?:^|[\s;])import\s*["']([^"']+)["']|\bimport\(\s*["']([^"']+)["']|\bnew URL\(\s*["'](\.[^"']+)["']/g;

/** Every trespass in one file, as sentences. */
function trespasses(file: string, source: string): string[] {
  const room = roomOf(file);
  if (!room) return [`${file} is in no room`];
  const found: string[] = [];
  const withoutComments = source.replace(/\/\*[\s\S]*?\*\//g, "").replace(/(^|\s)\/\/.*$/gm, "");
  for (const match of withoutComments.matchAll(importPattern)) {
    const target = (match[1] ?? match[2] ?? match[3] ?? match[4])!;
    if (!target.startsWith(".")) {
      const allowed = room.npm === "any" || (room.npm !== "none" && room.npm.test(target));
      if (!allowed) found.push(`${file}: ${room.name} may not use the package ${target}`);
      continue;
    }
    const resolved = path.posix
      .normalize(path.posix.join(path.posix.dirname(file), target))
      .replace(/\?.*$/, "");
    const there = roomOf(/\.\w+$/.test(resolved) ? resolved : `${resolved}.ts`) ?? roomOf(`${resolved}/`);
    if (!there) found.push(`${file}: ${target} leads out of the house`);
    else if (there !== room && !room.mayImport.includes(there.name))
      found.push(`${file}: ${room.name} may not import ${there.name} (${target})`);
    else if (there === room && room.name === "src/features" && featureOf(file) !== featureOf(resolved))
      found.push(`${file}: a feature may not import another (${target})`);
  }
  return found;
}

function sourceFiles(folder: string): string[] {
  return readdirSync(path.join(root, folder), { recursive: true, encoding: "utf8" })
    .map((name) => path.posix.join(folder, name.split(path.sep).join("/")))
    .filter((name) => /\.(ts|tsx|mts|js)$/.test(name) && !/\.generated\./.test(name));
}

describe("the rooms of the house", () => {
  it("imports go one way only", () => {
    const files = ["shared", "server", "src"].flatMap(sourceFiles);
    expect(files.length).toBeGreaterThan(50);
    expect(files.flatMap((file) => trespasses(file, readFileSync(path.join(root, file), "utf8")))).toEqual(
      [],
    );
  });

  it.each([
    ["a package in the physics", "shared/physics/body/gravity.ts", 'import { z } from "zod";'],
    ["the physics reaching up", "shared/physics/a.ts", 'import type { Note } from "../notebook/result";'],
    ["the notebook using the page's library", "shared/notebook/a.ts", 'import { useState } from "react";'],
    ["one feature using another", "src/features/notebook/A.tsx", 'import { b } from "../group/b";'],
    [
      "a part of the interface that knows a feature",
      "src/ui/A.tsx",
      'export { b } from "../features/group/b";',
    ],
    ["the page reaching into the server", "src/lib/api.ts", 'import("../../server/env");'],
    ["the database asking a route", "server/db/reads.ts", 'import { r } from "../routes/session";'],
    ["a command that authorises", "server/commands/a.ts", 'import "../policies/notebookPolicy";'],
    ["a policy with a package", "server/policies/a.ts", 'import { eq } from "drizzle-orm";'],
    [
      "a worker from another room",
      "src/lib/a.ts",
      'new Worker(new URL("../features/b/w.ts", import.meta.url))',
    ],
    ["a file in no room", "shared/loose.ts", ""],
  ])("notices %s", (_, file, source) => {
    expect(trespasses(file, source)).toHaveLength(1);
  });

  it("lets a room use itself and what lies below", () => {
    expect(
      trespasses("shared/notebook/kinds/body.ts", 'import { g } from "../../physics/body/gravity";'),
    ).toEqual([]);
    expect(trespasses("src/features/group/A.tsx", 'import { b } from "./b";')).toEqual([]);
  });
});

describe("the core is the same on every machine", () => {
  const forbidden =
    /\bMath\.(exp|log|log10|log2|pow|sin|cos|tan|asin|acos|atan|atan2|sinh|cosh|tanh|cbrt|hypot|expm1|log1p|random)\b|\*\*|\bDate\b|\bperformance\b|\bprocess\b|\bdocument\.|\bwindow\b/;

  it("uses no built-in function whose last bit differs between engines, no clock, no chance", () => {
    const offenders = ["shared/physics", "shared/notebook"].flatMap(sourceFiles).filter((file) => {
      const code = readFileSync(path.join(root, file), "utf8")
        .replace(/\/\*[\s\S]*?\*\//g, "")
        .replace(/(^|\s)\/\/.*$/gm, "")
        .replace(/`(?:[^`\\]|\\.)*`|"(?:[^"\\\n]|\\.)*"/g, '""');
      return forbidden.test(
        code.replace(/\bdocument\.(cells|title|authors|headline|unitSystem|format)/g, ""),
      );
    });
    expect(offenders).toEqual([]);
  });
});
