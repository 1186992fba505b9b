import { plugins } from "@citation-js/core";
import { parse as parseName } from "@citation-js/name";
import "@citation-js/plugin-bibtex";
import "@citation-js/plugin-csl";
import "@citation-js/plugin-ris";
import { cautionText } from "../../shared/notebook/cautionText";
import type { CitationForm } from "../../shared/schemas/references";

export interface Cited {
  pin: string;
  group: { name: string; code: string };
  number: number;
  edition: number;
  title: string;
  authors: readonly string[];
  licence: string;
  engine: string;
  doi: string | null;
  publishedAt: Date;
}

/** How to cite a reference, in each form; the library formats from what it is given and fetches nothing. */
export function presentCitations(cited: Cited): Record<CitationForm, string> {
  const item = citationItem(cited);
  const bibliography = plugins.output.format("bibliography", [item], { template: "apa", format: "text" });
  return {
    text: `${bibliography.trim()} Tenuity engine ${cited.engine}. Licence ${cited.licence}.`,
    bibtex: `${plugins.output.format("bibtex", [item]).trim()}\n`,
    ris: `${plugins.output.format("ris", [item]).trim()}\n`,
    csl: `${JSON.stringify([item], null, 2)}\n`,
  };
}

/** As CSL-JSON, from which the other forms are made. */
function citationItem({ pin, group, number, edition, title, authors, licence, engine, doi, publishedAt }: Cited) {
  return {
    id: pin,
    type: "dataset",
    title,
    author: authors.map(authorName),
    issued: {
      "date-parts": [[publishedAt.getUTCFullYear(), publishedAt.getUTCMonth() + 1, publishedAt.getUTCDate()]],
    },
    publisher: group.name,
    number: `${group.code} ${number}`,
    version: `edition ${edition}`,
    license: licence,
    note: `Reference ${group.code} ${number}, edition ${edition}. Tenuity engine ${engine}. ${cautionText}`,
    ...(doi === null ? {} : { DOI: doi }),
  };
}

/** A name of one word, such as that of a collaboration, stays whole. */
function authorName(name: string): Record<string, string> {
  return /\s/.test(name.trim()) ? parseName(name) : { literal: name };
}
