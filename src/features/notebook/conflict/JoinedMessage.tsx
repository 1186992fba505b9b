import type { NotebookDocument } from "../../../../shared/notebook/document";
import { Message } from "../../../ui/Message";
import { TextButton } from "../../../ui/TextButton";
import type { Draft } from "../draft/draftReducer";
import { changeWords } from "./changeWords";

interface JoinedMessageProps {
  joined: NonNullable<Draft["joined"]>;
  document: NotebookDocument;
  onDismiss: () => void;
}

/** Says what someone else's saved changes have just brought into the draft. */
export function JoinedMessage({ joined, document, onDismiss }: JoinedMessageProps) {
  return (
    <Message
      state="remark"
      live="polite"
      className="mt-28"
      action={<TextButton onClick={onDismiss}>close</TextButton>}
    >
      {joined.by} saved changes, which are in the draft now: {changeWords(joined.changes, document)}.
    </Message>
  );
}
