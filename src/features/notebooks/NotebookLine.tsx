import { Link, useNavigate } from "react-router-dom";
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { failureSentence } from "../../lib/ApiError";
import { formatWhen } from "../../lib/format";
import { Menu, MenuItem, MenuLink } from "../../ui/Menu";
import { useNotify } from "../../ui/Notices";
import { StateWord } from "../../ui/StateMark";
import { StripThumb } from "../../ui/strip/StripThumb";
import { TextButton } from "../../ui/TextButton";
import { HeadlineValue } from "./HeadlineValue";
import {
  useArchiveNotebook,
  useDeleteNotebook,
  useDuplicateNotebook,
  useRestoreNotebook,
} from "./notebooksQueries";
import { binLine, peopleLine, standingLine, stateOf } from "./notebookSentences";

interface NotebookLineProps {
  notebook: NotebookListItem;
  now: Date;
  onRename: (notebook: NotebookListItem) => void;
  onMove: (notebook: NotebookListItem) => void;
}

/** One notebook of the list: its air, its name, what it answers, how it stands. The whole line leads to it. */
export function NotebookLine({ notebook, now, onRename, onMove }: NotebookLineProps) {
  const { summary, deletedAt } = notebook;
  const { state, words } = stateOf(notebook);
  return (
    <li className="notebook-line" data-binned={deletedAt !== null || undefined}>
      <div className="notebook-thumb" aria-hidden="true">
        {summary?.strip && <StripThumb strip={summary.strip} />}
      </div>
      <div className="notebook-name">
        <h2 className="font-serif text-[20px]/[26px]">
          {deletedAt === null ? (
            <Link to={`/notebooks/${notebook.id}`} className="notebook-link">
              {notebook.title}
            </Link>
          ) : (
            notebook.title
          )}
        </h2>
        <p className="type-meta text-ink2">{peopleLine(notebook)}</p>
      </div>
      <div className="notebook-headline">
        {summary?.headline.slice(0, 2).map((item) => (
          <HeadlineValue key={item.name} item={item} />
        ))}
      </div>
      <div className="notebook-state">
        <StateWord state={state}>{words}</StateWord>
        <p className="type-meta text-ink2">
          {deletedAt === null ? standingLine(notebook) : binLine(deletedAt, now)}
        </p>
      </div>
      <div className="notebook-when">
        <time dateTime={notebook.savedAt} className="type-meta whitespace-nowrap text-ink2">
          {formatWhen(new Date(notebook.savedAt), now)}
        </time>
        <NotebookVerbs notebook={notebook} onRename={onRename} onMove={onMove} />
      </div>
    </li>
  );
}

function NotebookVerbs({ notebook, onRename, onMove }: Omit<NotebookLineProps, "now">) {
  const { id, title, abilities, deletedAt } = notebook;
  const notify = useNotify();
  const toBin = useDeleteNotebook();
  const restore = useRestoreNotebook();
  const archive = useArchiveNotebook();
  const duplicate = useDuplicateNotebook();
  const navigate = useNavigate();

  function handleRestore() {
    restore.mutate(id, {
      onSuccess: () => notify({ state: "holds", text: `“${title}” stands on the shelf again.` }),
      onError: (error) =>
        notify({ state: "fault", text: `“${title}” stays in the bin. ${failureSentence(error)}` }),
    });
  }

  function handleDelete() {
    toBin.mutate(id, {
      onSuccess: () =>
        notify({
          text: `“${title}” is in the bin, for 30 days.`,
          action: { label: "Put back", run: handleRestore },
        }),
      onError: (error) =>
        notify({ state: "fault", text: `“${title}” was not deleted. ${failureSentence(error)}` }),
    });
  }

  function handleArchive(isArchived: boolean) {
    archive.mutate(
      { id, isArchived },
      {
        onSuccess: () =>
          notify({
            state: "holds",
            text: isArchived
              ? `“${title}” is in the archive, to be read only.`
              : `“${title}” stands on the shelf again.`,
            action: isArchived ? { label: "Put back", run: () => handleArchive(false) } : undefined,
          }),
        onError: (error) =>
          notify({ state: "fault", text: `“${title}” stays where it is. ${failureSentence(error)}` }),
      },
    );
  }

  function handleDuplicate() {
    duplicate.mutate(id, {
      onSuccess: (copy) =>
        notify({
          state: "holds",
          text: `A copy of “${title}” stands on your own shelf.`,
          action: { label: "Open", run: () => void navigate(`/notebooks/${copy.id}`) },
        }),
      onError: (error) =>
        notify({ state: "fault", text: `“${title}” was not duplicated. ${failureSentence(error)}` }),
    });
  }

  if (deletedAt !== null) {
    return abilities.restoreFromBin ? (
      <TextButton onClick={handleRestore} disabled={restore.isPending} aria-label={`Put back ${title}`}>
        Put back
      </TextButton>
    ) : null;
  }
  return (
    <Menu
      align="end"
      trigger={
        <TextButton className="notebook-more" aria-label={`More for ${title}`}>
          More
        </TextButton>
      }
    >
      <MenuLink to={`/notebooks/${id}`}>Open</MenuLink>
      {abilities.rename && <MenuItem onSelect={() => onRename(notebook)}>Rename</MenuItem>}
      {abilities.duplicate && (
        <MenuItem onSelect={handleDuplicate} disabled={duplicate.isPending}>
          Duplicate
        </MenuItem>
      )}
      {abilities.move && <MenuItem onSelect={() => onMove(notebook)}>Move</MenuItem>}
      {abilities.archive && <MenuItem onSelect={() => handleArchive(true)}>Archive</MenuItem>}
      {abilities.unarchive && (
        <MenuItem onSelect={() => handleArchive(false)}>Take out of the archive</MenuItem>
      )}
      {abilities.export && (
        <MenuLink to={`/api/notebooks/${id}/file`} download>
          Export as Markdown
        </MenuLink>
      )}
      {abilities.delete && (
        <MenuItem tone="fault" onSelect={handleDelete} disabled={toBin.isPending}>
          Delete
        </MenuItem>
      )}
    </Menu>
  );
}
