import { useMemo } from "react";
import type { NotebookDocument } from "../../../shared/notebook/document";
import type { KeptResult } from "../../../shared/schemas/results";
import { readingCommands } from "./cells/readingCommands";
import { useEvaluation } from "./evaluation/useEvaluation";
import { useNotebookNotes } from "./evaluation/useNotebookNotes";
import { ExplainDesk } from "./explain/ExplainDesk";
import { Sheet } from "./page/Sheet";
import { withKeptResults } from "./versions/withKeptResults";
import "./notebook.css";

interface PublishedArticleProps {
  pin: string;
  document: NotebookDocument;
  result: KeptResult;
}

/** The cells of a published edition, to be read: its numbers as published, its figures drawn anew. */
export function PublishedArticle({ pin, document, result }: PublishedArticleProps) {
  const computed = useEvaluation(`reference ${pin}`, document);
  const live = useMemo(() => withKeptResults(computed, document, result), [computed, document, result]);
  const notes = useNotebookNotes(document, live);
  return (
    <section aria-label="The notebook as published" className="notebook pt-44">
      <ExplainDesk document={document} live={live} unitSystem={document.unitSystem}>
        <Sheet
          document={document}
          live={live}
          tasks={null}
          notesOf={notes.of}
          unitSystem={document.unitSystem}
          isEditable={false}
          newCellId={null}
          commands={readingCommands}
        />
      </ExplainDesk>
    </section>
  );
}
