/** What the list says of a notebook, in words. */
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { formatCount, formatDay } from "../../lib/format";
import type { State } from "../../ui/StateMark";

/** "Tamsin Orevale, with Wiremu Castellane". */
export function peopleLine({ owner, coAuthors }: Pick<NotebookListItem, "owner" | "coAuthors">): string {
  if (coAuthors.length === 0) return owner.name;
  const names = coAuthors.map((person) => person.name);
  const last = names.pop();
  return `${owner.name}, with ${names.length > 0 ? `${names.join(", ")} and ${last}` : last}`;
}

/** The gravest thing first: "one fault, two cautions". A notebook that answers in full holds. */
export function stateOf({ summary }: Pick<NotebookListItem, "summary">): { state: State; words: string } {
  if (!summary) return { state: "waits", words: "not computed yet" };
  const { faults, cautions } = summary;
  const parts = [
    ...(faults > 0 ? [formatCount(faults, "fault")] : []),
    ...(cautions > 0 ? [formatCount(cautions, "caution")] : []),
  ];
  if (faults > 0) return { state: "fault", words: parts.join(", ") };
  if (cautions > 0) return { state: "caution", words: parts.join(", ") };
  return { state: "holds", words: "no cautions" };
}

/** What is kept of it, and one's own part where one is not the owner. */
export function standingLine({
  lastVersion,
  role,
  group,
}: Pick<NotebookListItem, "lastVersion" | "role" | "group">): string {
  const kept = lastVersion === null ? "draft" : `version ${lastVersion} kept`;
  const part = role === "owner" ? null : `you are ${role}`;
  return [kept, group ? `in ${group.code}` : null, part].filter((piece) => piece !== null).join("; ");
}

/** A body's name as a heading: cells are named in small letters. */
export function bodyName(name: string): string {
  return (name.charAt(0).toUpperCase() + name.slice(1)).replaceAll("_", " ");
}

const day = 86_400_000;
const keptInBin = 30;

/** "deleted 3 March, kept until 2 April". */
export function binLine(deletedAt: string, now: Date): string {
  const deleted = new Date(deletedAt);
  const gone = new Date(deleted.getTime() + keptInBin * day);
  return `deleted ${formatDay(deleted, now)}, kept until ${formatDay(gone, now)}`;
}
