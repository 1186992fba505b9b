import {
  groupActions,
  servedGroupActions,
  type GroupAbilities,
  type GroupAction,
  type GroupRole,
} from "../../shared/schemas/roles";
import type { Actor } from "./actor";
import { groupRules, type GroupRule } from "./rules";

/** What decides about a group, as seen from the actor. */
export interface GroupFacts {
  /** The actor's role; null outside. */
  actorRole: GroupRole | null;
  /** How many leads it has. */
  leads: number;
}

type Rule = (actor: Actor | null, group: GroupFacts) => boolean;

const ruleOf =
  ({ roles, isNotForLastLead }: GroupRule): Rule =>
  (actor, { actorRole, leads }) =>
    actor !== null &&
    actorRole !== null &&
    roles.includes(actorRole) &&
    !(isNotForLastLead && actorRole === "lead" && leads === 1);

export const groupPolicy = Object.fromEntries(
  groupActions.map((action) => [action, ruleOf(groupRules[action])]),
) as Record<GroupAction, Rule>;

export function groupAbilitiesOf(actor: Actor | null, group: GroupFacts): GroupAbilities {
  const entries = servedGroupActions.map((action) => [action, groupPolicy[action](actor, group)]);
  return Object.fromEntries(entries) as GroupAbilities;
}
