import type { GroupRole, ShareRole } from "../../shared/schemas/roles";

/** The people of the demonstration, by the part of their address before the @. */
export type DemoPerson = "j.aldaker" | "t.orevale" | "w.castellane" | "p.marrash" | "i.brandvold";

export interface DemoVersion {
  message: string;
  by: DemoPerson;
  daysAgo: number;
  /** What stood in the text then in place of what stands in the file now: [now, then]. */
  differences: [now: string, then: string][];
}

export interface DemoNotebook {
  /** In `notebooks/`. */
  file: string;
  owner: DemoPerson;
  /** When its draft was saved last. */
  hoursAgo: number;
  /** Role by which the whole group sees it. */
  groupRole: ShareRole | null;
  shares: [DemoPerson, ShareRole][];
  /** Oldest first. */
  versions: DemoVersion[];
}

/** Founded by its lead, who is not in the list of members. */
export const demoGroup = {
  name: "Carrow Aeronomy",
  code: "CAR",
  daysAgo: 320,
  lead: "j.aldaker",
  members: [
    ["t.orevale", "researcher"],
    ["w.castellane", "researcher"],
    ["i.brandvold", "researcher"],
    ["p.marrash", "guest"],
  ],
} as const satisfies {
  name: string;
  code: string;
  daysAgo: number;
  lead: DemoPerson;
  members: [DemoPerson, GroupRole][];
};
