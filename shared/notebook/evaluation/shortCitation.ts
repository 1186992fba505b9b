import { references } from "../../physics";

/** Surnames and year of a source, "Marrero and Mason 1972"; `key` is one of `references`. */
export function shortCitation(key: string): string {
  const citation = references[key] ?? key;
  const parts = /^(.*?) \((\d{4})\)/.exec(citation);
  if (!parts) return citation.replace(/\.$/, "");
  const [, authors, year] = parts;
  const surnames = authors.split(/, | and /).map((name) => name.replace(/^(?:\S+\. ?)+/, ""));
  const isOneBody = !/^\S+\. ?\S/.test(authors);
  if (isOneBody) return `${authors} ${year}`;
  return `${surnames.length > 2 ? `${surnames[0]} et al.` : surnames.join(" and ")} ${year}`;
}
