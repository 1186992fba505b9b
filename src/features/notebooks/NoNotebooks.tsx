import { Button } from "../../ui/Button";
import { ThinningAir } from "../../ui/ThinningAir";
import type { Beginning } from "./NewNotebookDialog";

interface NoNotebooksProps {
  onNew: (beginning: Beginning) => void;
  onImport: () => void;
}

/** What the list shows to someone who has nothing yet: what can be done next. */
export function NoNotebooks({ onNew, onImport }: NoNotebooksProps) {
  const ways = [
    {
      name: "An outline",
      line: "a body, its air and what escapes, with numbers to replace",
      verb: "Begin",
      isMain: true,
      act: () => onNew("outline"),
    },
    {
      name: "An empty notebook",
      line: "a title, then cells one by one",
      verb: "Begin",
      act: () => onNew("empty"),
    },
    { name: "From a file", line: "one Markdown file", verb: "Import", act: onImport },
  ];
  return (
    <>
      <ThinningAir width={1244} height={170} className="mt-18" />
      <p className="max-w-[34em] pt-44 type-abstract">
        Nothing here yet. A notebook begins with a body and its gases.
      </p>
      <ul className="ruled-list mt-28 max-w-[820px]">
        {ways.map(({ name, line, verb, isMain, act }) => (
          <li
            key={name}
            className="grid gap-x-28 gap-y-4 py-9 mid:grid-cols-[180px_minmax(0,1fr)_104px] mid:items-center"
          >
            <span className="font-serif text-[19px]/[26px]">{name}</span>
            <span className="type-meta text-ink2">{line}</span>
            <Button tone={isMain ? "main" : "plain"} onClick={act} className="w-full">
              {verb}
            </Button>
          </li>
        ))}
      </ul>
      <p className="pt-12 type-label text-ink3">What others share with you will stand here too.</p>
    </>
  );
}
