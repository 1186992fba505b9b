import { useState } from "react";
import { handbookChoices, type HandbookChoice } from "../../../../shared/notebook/handbookChoices";
import type { HandbookCell } from "../../../../shared/notebook/handbookCells";
import { Dialog } from "../../../ui/Dialog";
import { Field } from "../../../ui/Field";

interface HandbookChooserProps {
  onChoose: (choices: readonly HandbookCell[]) => void;
  onClose: () => void;
}

const rows = handbookChoices();
const groups = [...new Set(rows.map(({ group }) => group))];

/** A formula or symbol by its own letters first, then any name that it begins a word of. */
function isFound({ name, words }: HandbookChoice, query: string): boolean {
  const asked = query.toLowerCase().split(/\s+/).filter(Boolean);
  const known = `${name} ${words}`.toLowerCase().split(/[\s,]+/);
  return asked.every((start) => known.some((word) => word.startsWith(start)));
}

/** Rows of the handbook, one of which becomes a cell. */
export function HandbookChooser({ onChoose, onClose }: HandbookChooserProps) {
  const [query, setQuery] = useState("");
  const found = rows.filter((row) => isFound(row, query));
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="From the handbook"
      description="What is chosen becomes a cell, with the source of each number as a remark."
      width={600}
    >
      <div className="pt-18">
        <Field
          label="Search names and formulas"
          labelHidden
          type="search"
          placeholder="Search names and formulas"
          autoComplete="off"
          autoFocus
          value={query}
          onChange={(event) => setQuery(event.target.value)}
        />
        <div className="mt-12 max-h-[44vh] overflow-y-auto border-y border-rule py-8">
          {groups.map((group) => (
            <HandbookGroup
              key={group}
              group={group}
              rows={found.filter((row) => row.group === group)}
              onChoose={onChoose}
            />
          ))}
          {found.length === 0 && (
            <p role="status" className="type-meta text-ink2">
              Nothing in the handbook with “{query}” in its name or formula.
            </p>
          )}
        </div>
      </div>
    </Dialog>
  );
}

interface HandbookGroupProps extends Pick<HandbookChooserProps, "onChoose"> {
  group: string;
  rows: readonly HandbookChoice[];
}

function HandbookGroup({ group, rows: shown, onChoose }: HandbookGroupProps) {
  if (shown.length === 0) return null;
  return (
    <section aria-label={group} className="pb-8">
      <h3 className="py-4 font-serif text-[15px]/[20px] text-ink3 italic">{group}</h3>
      <ul>
        {shown.map(({ name, words, choices }) => (
          <li key={name}>
            <button
              type="button"
              className="flex w-full flex-wrap items-baseline gap-x-12 rounded border-0 bg-transparent px-8 py-3 text-left hover:bg-airglow-wash focus-visible:bg-airglow-wash focus-visible:outline-offset-[-2px]"
              onClick={() => onChoose(choices)}
            >
              <span className="text-[16px]/[22px]">{name}</span>{" "}
              <span className="type-label text-ink2">{words}</span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}
