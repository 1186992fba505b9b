import {
  notebookActions,
  servedNotebookActions,
  type GroupRole,
  type NotebookAbilities,
  type NotebookAction,
  type NotebookRole,
  type ShareRole,
} from "../../shared/schemas/roles";
import type { Actor } from "./actor";
import { notebookRules, type NotebookRule, type NotebookState } from "./rules";

/** What decides about a notebook, as seen from the actor. */
export interface NotebookFacts {
  ownerId: string;
  isDeleted: boolean;
  isArchived: boolean;
  /** Role by which it is shared with the actor in person. */
  shareRole: ShareRole | null;
  /** Role by which it is shared with everyone in its group. */
  groupRole: ShareRole | null;
  /** The actor's role in its group; null outside. */
  actorGroupRole: GroupRole | null;
  /** Of the version in vetting; null where none is. */
  vetting: VettingFacts | null;
}

export interface VettingFacts {
  /** Whether the notebook is the owner's work alone, without a co-author. */
  isOwnersAlone: boolean;
  /** How many leads its group has. */
  groupLeads: number;
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

const stateOf = ({ isDeleted, isArchived }: NotebookFacts): NotebookState =>
  isDeleted ? "binned" : isArchived ? "archived" : "live";

function hasPart({ part, isInPerson }: NotebookRule, actor: Actor, notebook: NotebookFacts): boolean {
  const own = notebookRoleOf(actor, notebook);
  if (part === null || own === null || rank[own] < rank[part]) return false;
  return !isInPerson || (own !== "owner" && notebook.shareRole !== null);
}

/** A lead looks into what is in vetting; they don't vet what is theirs alone, unless nobody else could. */
function leadsVetting({ leadInVetting }: NotebookRule, actor: Actor, notebook: NotebookFacts): boolean {
  const { vetting, actorGroupRole, ownerId } = notebook;
  if (leadInVetting === undefined || vetting === null || actorGroupRole !== "lead") return false;
  const isOwnAlone = actor.id === ownerId && vetting.isOwnersAlone;
  return leadInVetting === "any" || !isOwnAlone || vetting.groupLeads === 1;
}

const ruleOf =
  (rule: NotebookRule): Rule =>
  (actor, notebook) =>
    actor !== null &&
    rule.states.includes(stateOf(notebook)) &&
    (hasPart(rule, actor, notebook) || leadsVetting(rule, actor, notebook));

export const notebookPolicy = Object.fromEntries(
  notebookActions.map((action) => [action, ruleOf(notebookRules[action])]),
) as Record<NotebookAction, Rule>;

export function notebookAbilitiesOf(actor: Actor | null, notebook: NotebookFacts): NotebookAbilities {
  const entries = servedNotebookActions.map((action) => [action, notebookPolicy[action](actor, notebook)]);
  return Object.fromEntries(entries) as NotebookAbilities;
}
