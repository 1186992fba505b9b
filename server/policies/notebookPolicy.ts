import type {
  GroupRole,
  NotebookAbilities,
  NotebookAction,
  NotebookRole,
  ShareRole,
} from "../../shared/schemas/roles";
import type { Actor } from "./actor";

/** What decides about a notebook, as seen from the actor. */
export interface NotebookFacts {
  ownerId: string;
  isDeleted: boolean;
  /** Role by which it is shared with the actor in person. */
  shareRole: ShareRole | null;
  /** Role by which it is shared with everyone in its group. */
  groupRole: ShareRole | null;
  /** The actor's role in its group; null outside. */
  actorGroupRole: GroupRole | null;
}

type Rule = (actor: Actor | null, notebook: NotebookFacts) => boolean;

const rank: Record<NotebookRole, number> = { owner: 4, "co-author": 3, commenter: 2, reader: 1 };

/** The role that a share with the whole group gives: to a guest, who only sees, no more than a reader's. */
function roleThroughGroup({ groupRole, actorGroupRole }: NotebookFacts): ShareRole | null {
  if (groupRole === null || actorGroupRole === null) return null;
  return actorGroupRole === "guest" ? "reader" : groupRole;
}

/** The actor's part in a notebook: the most that ownership, a share in person or one with the group gives. */
export function notebookRoleOf(actor: Actor | null, notebook: NotebookFacts): NotebookRole | null {
  if (actor === null) return null;
  if (actor.id === notebook.ownerId) return "owner";
  const throughGroup = roleThroughGroup(notebook);
  if (notebook.shareRole === null) return throughGroup;
  if (throughGroup === null) return notebook.shareRole;
  return rank[throughGroup] > rank[notebook.shareRole] ? throughGroup : notebook.shareRole;
}

/** Holds the role or more, on a notebook that is not in the bin. */
const atLeast =
  (role: NotebookRole): Rule =>
  (actor, notebook) => {
    const own = notebookRoleOf(actor, notebook);
    return own !== null && rank[own] >= rank[role] && !notebook.isDeleted;
  };

export const notebookPolicy: Record<NotebookAction, Rule> = {
  read: atLeast("reader"),
  export: atLeast("reader"),
  edit: atLeast("co-author"),
  rename: atLeast("co-author"),
  keepVersion: atLeast("co-author"),
  restoreVersion: atLeast("co-author"),
  delete: atLeast("owner"),
  restoreFromBin: (actor, notebook) => notebookRoleOf(actor, notebook) === "owner" && notebook.isDeleted,
};

export function notebookAbilitiesOf(actor: Actor | null, notebook: NotebookFacts): NotebookAbilities {
  const entries = Object.entries(notebookPolicy).map(([action, rule]) => [action, rule(actor, notebook)]);
  return Object.fromEntries(entries) as NotebookAbilities;
}
