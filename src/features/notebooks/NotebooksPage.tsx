import { useQuery } from "@tanstack/react-query";
import { lazy, Suspense, useCallback, useState } from "react";
import type { GroupSummary } from "../../../shared/schemas/groups";
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { failureSentence } from "../../lib/ApiError";
import { formatCount } from "../../lib/format";
import { Button } from "../../ui/Button";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { SearchField } from "../../ui/SearchField";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import type { Beginning } from "./NewNotebookDialog";
import { NoNotebooks } from "./NoNotebooks";
import { NotebookLine } from "./NotebookLine";
import { NotebookShelf } from "./NotebookShelf";
import { notebooksQuery } from "./notebooksQueries";
import { useFileDrop } from "./useFileDrop";
import { useListFilters, type ListOrder, type ListPlace } from "./useListFilters";
import "./notebooks.css";

const ImportDialog = lazy(() => import("./ImportDialog").then((file) => ({ default: file.ImportDialog })));
const MoveDialog = lazy(() => import("./MoveDialog").then((file) => ({ default: file.MoveDialog })));
const NewNotebookDialog = lazy(() =>
  import("./NewNotebookDialog").then((file) => ({ default: file.NewNotebookDialog })),
);
const RenameDialog = lazy(() => import("./RenameDialog").then((file) => ({ default: file.RenameDialog })));

const places: readonly { value: ListPlace; label: string }[] = [
  { value: "shelf", label: "on the shelf" },
  { value: "archived", label: "in the archive" },
  { value: "bin", label: "in the bin" },
];
const orders: readonly { value: ListOrder; label: string }[] = [
  { value: "changed", label: "last changed first" },
  { value: "title", label: "by title" },
];

type Open =
  | { kind: "new"; beginning: Beginning }
  | { kind: "import"; file: File | null }
  | { kind: "rename"; notebook: NotebookListItem }
  | { kind: "move"; notebook: NotebookListItem };

/** The notebooks one may see, with the airs they speak of on one scale. `groups` are those one is in. */
export function NotebooksPage({ groups }: { groups: readonly GroupSummary[] }) {
  const [filters, changeFilters] = useListFilters();
  const list = useQuery(notebooksQuery(filters));
  const [open, setOpen] = useState<Open | null>(null);
  const isDraggedOver = useFileDrop(useCallback((file: File) => setOpen({ kind: "import", file }), []));
  const handleSearch = useCallback((q: string) => changeFilters({ q }), [changeFilters]);

  if (list.isPending) return <Opening what="the notebooks" />;
  if (list.isError && !list.data)
    return <ProblemPage error={list.error} onRetry={() => void list.refetch()} />;

  const { notebooks } = list.data;
  const isUnfiltered = filters.q === "" && filters.place === "shelf";
  const isBare = notebooks.length === 0 && isUnfiltered;
  const now = new Date();
  const close = (): void => setOpen(null);
  const openNew = (beginning: Beginning): void => setOpen({ kind: "new", beginning });
  const openImport = (): void => setOpen({ kind: "import", file: null });

  return (
    <Page title="Notebooks">
      <div className="flex flex-wrap items-center justify-between gap-x-18 gap-y-18 pt-28 wide:pt-44">
        <h1 className="type-display">Notebooks</h1>
        <div data-print="never" className="flex w-full items-center gap-16 wide:w-auto">
          {!isBare && (
            <SearchField label="Search titles and owners" value={filters.q} onChange={handleSearch} />
          )}
          {!isBare && (
            <Button tone="main" onClick={() => openNew("outline")}>
              New notebook
            </Button>
          )}
        </div>
      </div>
      {list.isError && (
        <Message
          state="caution"
          live="polite"
          className="mt-18"
          action={<TextButton onClick={() => void list.refetch()}>Try now</TextButton>}
        >
          {failureSentence(list.error)} The list is as it was last read.
        </Message>
      )}
      {isBare ? (
        <>
          <NoNotebooks onNew={openNew} onImport={openImport} />
          <p className="pt-8 type-label">
            <TextButton onClick={() => changeFilters({ place: "bin" })}>Look in the bin</TextButton>{" "}
            <TextButton onClick={() => changeFilters({ place: "archived" })}>or in the archive</TextButton>
          </p>
        </>
      ) : (
        <>
          {filters.place === "shelf" && <NotebookShelf notebooks={notebooks} className="pt-18" />}
          <p data-print="never" className="pt-36 pb-10 font-serif text-[20px]/[32px]">
            Notebooks{" "}
            <WordMenu
              label="Where"
              value={filters.place}
              options={places}
              onChange={(place) => changeFilters({ place })}
            />
            {", "}
            <WordMenu
              label="Order"
              value={filters.order}
              options={orders}
              onChange={(order) => changeFilters({ order })}
            />
          </p>
          {notebooks.length > 0 ? (
            <ul className="ruled-list" aria-label="Notebooks" aria-busy={list.isPlaceholderData}>
              {notebooks.map((notebook) => (
                <NotebookLine
                  key={notebook.id}
                  notebook={notebook}
                  now={now}
                  onRename={(chosen) => setOpen({ kind: "rename", notebook: chosen })}
                  onMove={(chosen) => setOpen({ kind: "move", notebook: chosen })}
                />
              ))}
            </ul>
          ) : (
            <p className="border-t-[1.5px] border-ink pt-18 type-abstract">
              {filters.q
                ? `Nothing with “${filters.q}” in its title or its owner’s name.`
                : filters.place === "bin"
                  ? "The bin is empty."
                  : "The archive is empty."}
              {filters.q && (
                <TextButton className="ml-12" onClick={() => changeFilters({ q: "" })}>
                  Show all
                </TextButton>
              )}
            </p>
          )}
          <p className="pt-18 type-label text-ink3">
            <span role="status">{countLine(notebooks.length)}</span>{" "}
            <TextButton data-print="never" className="text-[13px]/[18px]" onClick={openImport}>
              Import a Markdown file
            </TextButton>
          </p>
        </>
      )}
      <Suspense>
        {open?.kind === "new" && (
          <NewNotebookDialog groups={groups} beginning={open.beginning} onClose={close} />
        )}
        {open?.kind === "import" && <ImportDialog groups={groups} file={open.file} onClose={close} />}
        {open?.kind === "move" && <MoveDialog notebook={open.notebook} groups={groups} onClose={close} />}
        {open?.kind === "rename" && <RenameDialog notebook={open.notebook} onClose={close} />}
      </Suspense>
      {isDraggedOver && (
        <div className="pointer-events-none fixed inset-12 z-30 grid place-items-end border border-dashed border-dusk p-28">
          <p className="bg-raised px-18 py-10 type-control shadow-float">Let go to import the file</p>
        </div>
      )}
    </Page>
  );
}

function countLine(count: number): string {
  const words = formatCount(count, "notebook");
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;
}
