import { useState } from "react";
import { Link } from "react-router-dom";
import type { CitationForm, ReferenceResponse } from "../../../shared/schemas/references";
import { formatDay, formatNumber } from "../../lib/format";
import { Rich } from "../../lib/Rich";
import { TextButton } from "../../ui/TextButton";
import { EditionActs } from "./EditionActs";

const forms: readonly { form: CitationForm; label: string }[] = [
  { form: "text", label: "plain text" },
  { form: "bibtex", label: "BibTeX" },
  { form: "ris", label: "RIS" },
  { form: "csl", label: "CSL" },
];

/** The note under the article: cite, editions, vetted, recomputed, rests on, take away. */
export function AboutEdition({ reference }: { reference: ReferenceResponse }) {
  const { pin, editions, vettedBy, isVettedByOwner, publishedAt, licence, doi, restsOn, builtUpon } = reference;
  const now = new Date();
  return (
    <section aria-labelledby="about-heading" className="pt-44">
      <h2 id="about-heading" className="pb-8 type-section">
        About this edition
      </h2>
      <dl className="about-edition">
        <dt>Cite</dt>
        <dd>
          <Citation reference={reference} />
        </dd>
        <dt>Licence</dt>
        <dd>
          {licence}
          {doi && (
            <>
              {". DOI "}
              <a href={`https://doi.org/${doi}`}>{doi}</a>
            </>
          )}
        </dd>
        <dt>Editions</dt>
        <dd>
          {editions.map((one) => (
            <p key={one.pin}>
              <b>{one.edition}</b>{" "}
              {one.pin === pin ? "this one" : <Link to={`/references/${one.pin}`}>read it</Link>},{" "}
              {formatDay(new Date(one.publishedAt), now)}, {one.state}
            </p>
          ))}
        </dd>
        <dt>Vetted</dt>
        <dd>
          by {vettedBy} on {formatDay(new Date(publishedAt), now)}: all {reference.checks.length} checks held.
          {isVettedByOwner && " It is the lead’s own work; the group had no other lead."}
        </dd>
        <dt>Computed</dt>
        <dd>
          with engine {reference.engine}. <Recomputed reference={reference} /> Content{" "}
          <code className="break-all">{reference.contentHash}</code>
        </dd>
        <dt>Rests on</dt>
        <dd>
          <Pins pins={restsOn} none="no other reference" />. Built upon by <Pins pins={builtUpon} none="none yet" />.
        </dd>
        <dt>Take away</dt>
        <dd>
          <a href={`/api/references/${pin}/notebook.md`}>the notebook, Markdown</a>,{" "}
          <a href={`/api/references/${pin}/results.json`}>all results, JSON</a>
          {reference.notebookId && (
            <>
              , or open <Link to={`/notebooks/${reference.notebookId}`}>the notebook’s draft</Link>
            </>
          )}
        </dd>
      </dl>
      <EditionActs reference={reference} />
    </section>
  );
}

function Citation({ reference: { citations } }: { reference: ReferenceResponse }) {
  const [form, setForm] = useState<CitationForm>("text");
  return (
    <>
      {form === "text" ? <p>{citations.text}</p> : <pre className="reference-scroll">{citations[form]}</pre>}
      <p className="flex flex-wrap gap-14 type-label" role="group" aria-label="Form of the citation">
        {forms.map(({ form: one, label }) => (
          <TextButton key={one} aria-pressed={one === form} onClick={() => setForm(one)}>
            {label}
          </TextButton>
        ))}
      </p>
    </>
  );
}

function Recomputed({ reference: { recomputed } }: { reference: ReferenceResponse }) {
  if (!recomputed) return null;
  const { engine, drift } = recomputed;
  if (drift.failure !== null) return <>With engine {engine} it could not be computed again. {drift.failure} </>;
  const others = drift.changed > 0 ? ` ${drift.changed} results are new, gone or of another kind.` : "";
  if (drift.largest === null)
    return (
      <>
        Recomputed with engine {engine}: no number moved.{others}{" "}
      </>
    );
  return (
    <>
      Recomputed with engine {engine}: the largest change is <Rich text={formatNumber(drift.largest * 100, 2)} /> %, of{" "}
      <code>{drift.name}</code>.{others}{" "}
    </>
  );
}

function Pins({ pins, none }: { pins: ReferenceResponse["restsOn"]; none: string }) {
  if (pins.length === 0) return none;
  return pins.map(({ pin, title }, index) => (
    <span key={pin}>
      {index > 0 && ", "}
      {title === null ? pin : <Link to={`/references/${pin}`}>{`${pin}, ${title}`}</Link>}
    </span>
  ));
}
