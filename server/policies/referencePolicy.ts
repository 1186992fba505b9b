import { referenceActions, type GroupRole, type ReferenceAction } from "../../shared/schemas/roles";
import type { Actor } from "./actor";
import { referenceRules, type ReferenceRule } from "./rules";

/** What decides about a published reference, as seen from the actor. */
export interface ReferenceFacts {
  /** Whether its group lets it be read without an account. */
  isPublic: boolean;
  /** The actor's role in its group; null outside. */
  actorGroupRole: GroupRole | null;
}

type Rule = (actor: Actor | null, reference: ReferenceFacts) => boolean;

const ruleOf =
  ({ roles, isForAllIfPublic }: ReferenceRule): Rule =>
  (actor, { isPublic, actorGroupRole }) =>
    (Boolean(isForAllIfPublic) && isPublic) ||
    (actor !== null && actorGroupRole !== null && roles.includes(actorGroupRole));

export const referencePolicy = Object.fromEntries(
  referenceActions.map((action) => [action, ruleOf(referenceRules[action])]),
) as Record<ReferenceAction, Rule>;
