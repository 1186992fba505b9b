import type { GroupRole, ShareRole } from "../../shared/schemas/roles";
import { ilmaraThreads, type DemoThread } from "./demoThreads";

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
  /** On its draft. */
  threads?: readonly DemoThread[];
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

/** Of the lead, to the group, without an answer yet. */
export const demoInvitation = { email: "l.verrano@lomme.example", role: "guest", daysAgo: 3 } as const;

export const demoNotebooks: readonly DemoNotebook[] = [
  {
    file: "ilmara-dayside.md",
    owner: "t.orevale",
    hoursAgo: 2,
    groupRole: "reader",
    shares: [
      ["w.castellane", "co-author"],
      ["p.marrash", "reader"],
    ],
    versions: [
      {
        message: "First column, with the temperature of the first occultation alone",
        by: "t.orevale",
        daysAgo: 41,
        differences: [
          ["T_quiet = 428 ± 45 K", "T_quiet = 460 ± 70 K"],
          ["K_base  = 1e6 cm^2/s within factor 2", "K_base  = 3e6 cm^2/s within factor 4"],
        ],
      },
      {
        message: "Mixing from the methane of two years",
        by: "w.castellane",
        daysAgo: 26,
        differences: [["T_quiet = 428 ± 45 K", "T_quiet = 460 ± 70 K"]],
      },
      { message: "Both occultations; cooler by 32 K", by: "t.orevale", daysAgo: 3, differences: [] },
    ],
    threads: ilmaraThreads,
  },
  {
    // Not kept as a version: its sweeps and its spread would have to be computed before the first start.
    file: "ilmara-how-sure.md",
    owner: "w.castellane",
    hoursAgo: 19,
    groupRole: "reader",
    shares: [["t.orevale", "co-author"]],
    versions: [],
  },
  {
    file: "nirel-half-atmosphere.md",
    owner: "i.brandvold",
    hoursAgo: 29,
    groupRole: "commenter",
    shares: [["t.orevale", "co-author"]],
    versions: [
      { message: "As shown to the group in November", by: "i.brandvold", daysAgo: 12, differences: [] },
    ],
  },
  {
    file: "saranth-hydrostatic-limit.md",
    owner: "i.brandvold",
    hoursAgo: 75,
    groupRole: "reader",
    shares: [],
    versions: [],
  },
  {
    file: "tessal-quiet-star.md",
    owner: "i.brandvold",
    hoursAgo: 290,
    groupRole: "reader",
    shares: [],
    versions: [
      {
        message: "Before the new run of the thermosphere model",
        by: "i.brandvold",
        daysAgo: 150,
        differences: [["T_exo = 760 ± 60 K", "T_exo = 820 ± 90 K"]],
      },
      { message: "Quiet star, as in group note 7", by: "i.brandvold", daysAgo: 13, differences: [] },
    ],
  },
  {
    // Alone on its owner's shelf: nobody else sees it.
    file: "oda-perihelion.md",
    owner: "t.orevale",
    hoursAgo: 700,
    groupRole: null,
    shares: [],
    versions: [],
  },
];
