import { useState } from "react";
import type { Comment } from "../../../../shared/schemas/comments";
import type { Person } from "../../../../shared/schemas/people";
import { failureSentence } from "../../../lib/ApiError";
import { formatTime, formatWhen } from "../../../lib/format";
import { useNotify } from "../../../ui/Notices";
import { TextButton } from "../../../ui/TextButton";
import { ProseText } from "../cells/ProseText";
import { CommentForm } from "./CommentForm";

interface CommentViewProps {
  comment: Comment;
  readers: readonly Person[];
  onEdit: (text: string) => Promise<unknown>;
  onDelete: () => Promise<unknown>;
}

/** What one person has said: who, when, and the words; their author can write them anew or delete them. */
export function CommentView({ comment, readers, onEdit, onDelete }: CommentViewProps) {
  const [state, setState] = useState<"read" | "edit" | "delete">("read");
  const notify = useNotify();
  const at = new Date(comment.createdAt);
  const now = new Date();
  const when = formatWhen(at, now);

  if (comment.isDeleted) {
    return <li className="comment comment-deleted">{comment.author.name} deleted what stood here.</li>;
  }
  const remove = () =>
    onDelete().catch((error: unknown) => {
      setState("read");
      notify({ state: "fault", text: `The comment stands. ${failureSentence(error)}` });
    });

  return (
    <li className="comment">
      <p className="comment-head">
        <b>{comment.author.name}</b>{" "}
        <time dateTime={comment.createdAt}>
          {when.startsWith("today") ? when : `${when} ${formatTime(at)}`}
        </time>
        {comment.editedAt && ", changed since"}
        {comment.isUnread && <span className="comment-new">new</span>}
      </p>
      {state === "edit" ? (
        <CommentForm
          label="Your comment"
          verb="Save"
          initial={comment.text}
          readers={readers}
          onSend={onEdit}
          onDone={() => setState("read")}
        />
      ) : (
        <div className="comment-text">
          <ProseText text={comment.text} mentions={comment.mentions.map(({ name }) => name)} />
        </div>
      )}
      {comment.abilities.edit && state === "read" && (
        <p className="comment-own" data-print="never">
          <TextButton onClick={() => setState("edit")}>edit</TextButton>
          <TextButton onClick={() => setState("delete")}>delete</TextButton>
        </p>
      )}
      {state === "delete" && (
        <p className="comment-own" data-asking role="group" aria-label="Delete this comment for good?">
          <span>Delete it for good?</span>
          <TextButton tone="fault" autoFocus onClick={() => void remove()}>
            Delete
          </TextButton>
          <TextButton onClick={() => setState("read")}>Keep it</TextButton>
        </p>
      )}
    </li>
  );
}
