import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { Person } from "../../../../shared/schemas/people";
import { formatCount } from "../../../lib/format";

/** Who may see a notebook, in a few words for its bar. */
export function visibleTo({ owner, sharedWith, group }: NotebookResponse, person: Person): React.ReactNode {
  const isOwn = owner.id === person.id;
  if (sharedWith === 0) return isOwn ? "open to you alone" : `open to ${owner.name} alone`;
  const people = <b>{formatCount(sharedWith + 1, "person", "people")}</b>;
  return (
    <>
      {!isOwn && `by ${owner.name}, `}open to {people}
      {group && ` in ${group.name}`}
    </>
  );
}
