import { useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { failureSentence } from "../../../lib/ApiError";
import type { UnitSystem } from "../../../lib/format";
import { Button } from "../../../ui/Button";
import { Chevron } from "../../../ui/Chevron";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Menu, MenuChoice, MenuItem, MenuLink, MenuRule } from "../../../ui/Menu";
import { Message } from "../../../ui/Message";
import { TextButton } from "../../../ui/TextButton";
import { useDeleteNotebook } from "../notebookQueries";
import { downloadNotebook } from "./downloadNotebook";
import { HeadlineDialog } from "./HeadlineDialog";
import { KeysDialog } from "./KeysDialog";
import { useMediaQuery } from "./useMediaQuery";

interface MoreMenuProps {
  notebook: NotebookResponse;
  /** As it is on the page, unsaved text and all. */
  document: NotebookDocument;
  onDeleted: () => void;
  /** Opens the list of who may see it. */
  onShares: () => void;
  /** On narrow pages the menu also has what the bar has no room for. */
  unitSystem: UnitSystem;
  onUnitSystem: (system: UnitSystem) => void;
  /** null where no version can be kept now. */
  onKeep: (() => void) | null;
  /** null where the notebook is only read. */
  headline: { names: () => string[]; onChange: (headline: string[]) => void } | null;
}

const unitOptions: readonly { value: UnitSystem; label: string }[] = [
  { value: "SI", label: "SI units" },
  { value: "cgs", label: "cgs units" },
];

/** What else can be done with a notebook. */
export function MoreMenu({
  notebook,
  document,
  onDeleted,
  onShares,
  unitSystem,
  onUnitSystem,
  onKeep,
  headline,
}: MoreMenuProps) {
  const isNarrow = useMediaQuery("(max-width: 639.98px)");
  const [isAsking, setAsking] = useState(false);
  const [shown, setShown] = useState<"headline" | "keys" | null>(null);
  const deletion = useDeleteNotebook(notebook.id);

  return (
    <>
      <Menu
        align="end"
        trigger={
          <TextButton className="inline-flex flex-none items-center gap-8 text-[14.5px]">
            More <Chevron />
          </TextButton>
        }
      >
        {isNarrow && (
          <>
            {onKeep && <MenuItem onSelect={onKeep}>Keep a version</MenuItem>}
            <MenuChoice value={unitSystem} options={unitOptions} onChange={onUnitSystem} />
            <MenuRule />
          </>
        )}
        {notebook.abilities.seeShares && (
          <MenuItem onSelect={onShares}>{notebook.abilities.share ? "Share" : "Who may see it"}</MenuItem>
        )}
        <MenuLink to={`/notebooks/${notebook.id}/versions`}>Versions</MenuLink>
        {notebook.lastVersion !== null && (
          <MenuLink to={`/notebooks/${notebook.id}/compare`}>Compare</MenuLink>
        )}
        <MenuItem onSelect={() => void downloadNotebook(document)}>Export as Markdown</MenuItem>
        <MenuItem onSelect={() => setTimeout(() => window.print(), 50)}>Print</MenuItem>
        {headline && <MenuItem onSelect={() => setShown("headline")}>Headline</MenuItem>}
        <MenuItem onSelect={() => setShown("keys")}>Keys</MenuItem>
        {notebook.abilities.delete && (
          <>
            <MenuRule />
            <MenuItem tone="fault" onSelect={() => setAsking(true)}>
              Delete
            </MenuItem>
          </>
        )}
      </Menu>
      {shown === "headline" && headline && (
        <HeadlineDialog
          headline={document.headline}
          names={headline.names()}
          onChange={headline.onChange}
          onClose={() => setShown(null)}
        />
      )}
      {shown === "keys" && <KeysDialog onClose={() => setShown(null)} />}
      <Dialog
        open={isAsking}
        onOpenChange={setAsking}
        title="Delete this notebook"
        description="It goes to the bin with its versions and stays there for 30 days; until then it can be put back."
      >
        {deletion.isError && (
          <Message state="fault" live="assertive" className="mt-18">
            {failureSentence(deletion.error)}
          </Message>
        )}
        <DialogActions>
          <Button
            tone="fault"
            busy={deletion.isPending}
            onClick={() => deletion.mutate(undefined, { onSuccess: onDeleted })}
          >
            Delete
          </Button>
          <TextButton onClick={() => setAsking(false)}>Keep it</TextButton>
        </DialogActions>
      </Dialog>
    </>
  );
}
