import type { GroupAbilities, GroupAction, GroupRole } from "../../shared/schemas/roles";
import type { Actor } from "./actor";

/** What decides about a group, as seen from the actor. */
export interface GroupFacts {
  /** The actor's role; null outside. */
  actorRole: GroupRole | null;
  /** How many leads it has. */
  leads: number;
}

type Rule = (actor: Actor | null, group: GroupFacts) => boolean;

const isOneOf =
  (...roles: GroupRole[]): Rule =>
  (actor, { actorRole }) =>
    actor !== null && actorRole !== null && roles.includes(actorRole);

export const groupPolicy: Record<GroupAction, Rule> = {
  see: isOneOf("lead", "researcher", "guest"),
  createNotebook: isOneOf("lead", "researcher"),
  addMember: isOneOf("lead"),
  setRole: isOneOf("lead"),
  removeMember: isOneOf("lead"),
  leave: (actor, group) =>
    actor !== null && group.actorRole !== null && !(group.actorRole === "lead" && group.leads === 1),
};

export function groupAbilitiesOf(actor: Actor | null, group: GroupFacts): GroupAbilities {
  const entries = Object.entries(groupPolicy).map(([action, rule]) => [action, rule(actor, group)]);
  return Object.fromEntries(entries) as GroupAbilities;
}
