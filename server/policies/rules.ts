/** Who may do what, as one table. The policies read it; every route asks them. */
import type {
  GroupAction,
  GroupRole,
  NotebookAction,
  NotebookRole,
  ReferenceAction,
} from "../../shared/schemas/roles";

/** In work, put away but readable, or on its way out. */
export type NotebookState = "live" | "archived" | "binned";

export interface NotebookRule {
  /** The least part in the notebook that allows it; null where no part does. */
  part: NotebookRole | null;
  states: readonly NotebookState[];
  /** Only for whom it is shared with in person: what comes with a group is not theirs to give up. */
  isInPerson?: true;
  /** The lead of its group may too, while a version of it is in vetting; or only unless it is their own alone. */
  leadInVetting?: "any" | "unless own alone";
}

const live = ["live"] as const;
const kept = ["live", "archived"] as const;

export const notebookRules: Record<NotebookAction, NotebookRule> = {
  read: { part: "reader", states: kept },
  export: { part: "reader", states: kept },
  fork: { part: "reader", states: kept },
  duplicate: { part: "reader", states: kept },
  seeShares: { part: "reader", states: kept },
  leave: { part: "reader", states: kept, isInPerson: true },

  comment: { part: "commenter", states: live },
  resolveOwnThread: { part: "commenter", states: live },

  edit: { part: "co-author", states: live },
  rename: { part: "co-author", states: live },
  keepVersion: { part: "co-author", states: live },
  restoreVersion: { part: "co-author", states: live },
  resolveAnyThread: { part: "co-author", states: live },
  answerCautions: { part: "co-author", states: live },
  offer: { part: "co-author", states: live },
  takeOffers: { part: "co-author", states: live },
  requestVetting: { part: "co-author", states: live },

  share: { part: "owner", states: kept },
  handOver: { part: "owner", states: kept },
  move: { part: "owner", states: kept },
  archive: { part: "owner", states: live },
  unarchive: { part: "owner", states: ["archived"] },
  delete: { part: "owner", states: kept },
  restoreFromBin: { part: "owner", states: ["binned"] },

  // The version asked about, not the draft, which stays private.
  readVersionInVetting: { part: "reader", states: kept, leadInVetting: "any" },
  vet: { part: null, states: kept, leadInVetting: "unless own alone" },
  publish: { part: null, states: kept, leadInVetting: "unless own alone" },
};

export interface GroupRule {
  roles: readonly GroupRole[];
  /** Not for the last lead: a group keeps at least one. */
  isNotForLastLead?: true;
}

const everyone = ["lead", "researcher", "guest"] as const;
const leads = ["lead"] as const;

export const groupRules: Record<GroupAction, GroupRule> = {
  see: { roles: everyone },
  seeReferences: { roles: everyone },
  createNotebook: { roles: ["lead", "researcher"] },
  rename: { roles: leads },
  invite: { roles: leads },
  revokeInvitation: { roles: leads },
  setRole: { roles: leads },
  removeMember: { roles: leads },
  handOver: { roles: leads },
  seeAudit: { roles: leads },
  seeQueue: { roles: leads },
  leave: { roles: everyone, isNotForLastLead: true },
};

export interface ReferenceRule {
  /** Roles in the reference's group. */
  roles: readonly GroupRole[];
  /** Everyone, signed in or out, where the group lets its references be read. */
  isForAllIfPublic?: true;
}

export const referenceRules: Record<ReferenceAction, ReferenceRule> = {
  read: { roles: everyone, isForAllIfPublic: true },
  cite: { roles: everyone, isForAllIfPublic: true },
  use: { roles: everyone, isForAllIfPublic: true },
  supersede: { roles: leads },
  withdraw: { roles: leads },
  // Its DOI, and whether it is read without an account.
  describe: { roles: leads },
};
