import { useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { Chevron } from "../../../ui/Chevron";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Menu, MenuItem, MenuLink, MenuRule } from "../../../ui/Menu";
import { Message } from "../../../ui/Message";
import { TextButton } from "../../../ui/TextButton";
import { useDeleteNotebook } from "../notebookQueries";
import { downloadNotebook } from "./downloadNotebook";

interface MoreMenuProps {
  notebook: NotebookResponse;
  /** As it is on the page, unsaved text and all. */
  document: NotebookDocument;
  onDeleted: () => void;
}

/** What else can be done with a notebook. */
export function MoreMenu({ notebook, document, onDeleted }: MoreMenuProps) {
  const [isAsking, setAsking] = useState(false);
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
        <MenuLink to={`/notebooks/${notebook.id}/versions`}>Versions</MenuLink>
        <MenuItem onSelect={() => void downloadNotebook(document)}>Export as Markdown</MenuItem>
        <MenuItem onSelect={() => setTimeout(() => window.print(), 50)}>Print</MenuItem>
        {notebook.abilities.delete && (
          <>
            <MenuRule />
            <MenuItem tone="fault" onSelect={() => setAsking(true)}>
              Delete
            </MenuItem>
          </>
        )}
      </Menu>
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
