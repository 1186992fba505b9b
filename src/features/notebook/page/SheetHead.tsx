import { useState } from "react";
import { documentLimits, type NotebookDocument } from "../../../../shared/notebook/document";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";
import { AltitudeRule } from "../../../ui/AltitudeRule";

interface SheetHeadProps {
  document: NotebookDocument;
  /** Facts over the title: "Notebook", "draft, revision 214", … */
  kicker: readonly string[];
  /** null where the reader may not edit. */
  edit: ((edit: DocumentEdit, words?: string) => void) | null;
  children: React.ReactNode;
}

/** The head of the article: the rule, what this is, its title and authors, and its numbers. */
export function SheetHead({ document, kicker, edit, children }: SheetHeadProps) {
  return (
    <header className="sheet-head">
      <AltitudeRule />
      <p className="kicker">
        {kicker.map((fact) => (
          <span key={fact}>{fact}</span>
        ))}
      </p>
      {edit ? (
        <h1 className="type-display">
          <TitleField title={document.title} onChange={(title) => edit({ type: "changeTitle", title })} />
        </h1>
      ) : (
        <h1 className="type-display">{document.title || "Untitled"}</h1>
      )}
      <Authors
        authors={document.authors}
        onChange={edit && ((authors) => edit({ type: "changeAuthors", authors }))}
      />
      {children}
    </header>
  );
}

/** The title, written where it stands. One line, however many it takes to show. */
function TitleField({ title, onChange }: { title: string; onChange: (title: string) => void }) {
  return (
    <textarea
      className="title-field"
      aria-label="Title"
      placeholder="Untitled"
      rows={1}
      value={title}
      maxLength={documentLimits.titleLength}
      onChange={(event) => onChange(oneLine(event.target.value))}
      onKeyDown={(event) => {
        if (event.key !== "Enter" && event.key !== "Escape") return;
        event.preventDefault();
        event.currentTarget.blur();
      }}
    />
  );
}

/** Without the line ends and control characters that a title has no use for. */
const oneLine = (text: string): string => text.replace(/\p{Cc}+/gu, " ");

function Authors({
  authors,
  onChange,
}: {
  authors: string[];
  onChange: ((authors: string[]) => void) | null;
}) {
  const [written, setWritten] = useState<string | null>(null);
  const words = authorWords(authors);

  if (!onChange) return words === "" ? null : <p className="authors">{words}</p>;
  if (written === null) {
    return (
      <p className="authors">
        <button type="button" className="authors-button" onClick={() => setWritten(authors.join(", "))}>
          {words || <span className="text-ink3">Authors</span>}
        </button>
      </p>
    );
  }
  const finish = () => {
    setWritten(null);
    const next = readAuthors(written);
    if (next.join("\n") !== authors.join("\n")) onChange(next);
  };
  return (
    <p className="authors">
      <input
        className="authors-field"
        aria-label="Authors, in order, separated by commas"
        placeholder="Authors, in order, separated by commas"
        value={written}
        autoFocus
        onChange={(event) => setWritten(event.target.value)}
        onBlur={finish}
        onKeyDown={(event) => {
          if (event.key === "Enter") event.currentTarget.blur();
          if (event.key === "Escape") setWritten(null);
        }}
      />
    </p>
  );
}

/** "A, B and C" */
function authorWords(authors: readonly string[]): string {
  if (authors.length < 2) return authors.join("");
  return `${authors.slice(0, -1).join(", ")} and ${authors[authors.length - 1]}`;
}

function readAuthors(text: string): string[] {
  return oneLine(text)
    .split(",")
    .map((name) => name.trim().slice(0, documentLimits.authorLength))
    .filter((name) => name !== "")
    .slice(0, documentLimits.authors);
}
