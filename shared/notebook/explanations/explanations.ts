/** Every record by kind of cell, and the record of any result. */
import type { CellKind } from "../document";
import { bodyExplanations } from "./bodyExplanations";
import { columnExplanations } from "./columnExplanations";
import { coronaExplanations } from "./coronaExplanations";
import { escapeExplanations } from "./escapeExplanations";
import { lossExplanations } from "./lossExplanations";
import { nonthermalExplanations } from "./nonthermalExplanations";
import type { ExplanationRecord } from "./record";
import { spreadExplanations, sweepExplanations } from "./spreadExplanations";

/** Of kinds that answer with results of their own; what a values cell gives is explained by what is written in it. */
export const explanations: Readonly<Partial<Record<CellKind, readonly ExplanationRecord[]>>> = {
  body: bodyExplanations,
  column: columnExplanations,
  escape: escapeExplanations,
  corona: coronaExplanations,
  nonthermal: nonthermalExplanations,
  loss: lossExplanations,
  spread: spreadExplanations,
  sweep: sweepExplanations,
};

export interface FoundRecord {
  record: ExplanationRecord;
  /** What GAS, ION or RESULT stands for. */
  subject: string | null;
  /** The result is the decimal logarithm of what the record describes. */
  isLogarithm: boolean;
}

const subjects = /GAS|ION|RESULT/;
const patterns: Readonly<Record<string, string>> = {
  GAS: "([A-Z][A-Za-z0-9]*)",
  ION: "([^.]+\\+)",
  RESULT: "(.+)",
};

/** @param name of a result, with or without `log10_`, or table and column */
export function findRecord(kind: CellKind, name: string): FoundRecord | null {
  const records = explanations[kind] ?? [];
  const direct = matching(records, name);
  if (direct) return { ...direct, isLogarithm: false };
  const base = name.replace(/(^|\.)log10_([^.]+)$/, "$1$2");
  const twin = base === name ? null : matching(records, base);
  return twin && { ...twin, isLogarithm: true };
}

function matching(
  records: readonly ExplanationRecord[],
  name: string,
): { record: ExplanationRecord; subject: string | null } | null {
  for (const record of records) {
    const match = patternOf(record.name).exec(name);
    if (match) return { record, subject: match[1] ?? null };
  }
  return null;
}

function patternOf(name: string): RegExp {
  const escaped = name.replace(/\./g, "\\.");
  return new RegExp(`^${escaped.replace(subjects, (subject) => patterns[subject])}$`);
}

/** Puts in what GAS, ION or RESULT stands for. */
export function withSubject(text: string, subject: string | null): string {
  return subject === null ? text : text.replace(subjects, subject);
}
