import type { DemoAccount } from "../../shared/schemas/session";

/** The demonstration's people and, for the sign-in page, what part each plays. */
export const demoAccounts: readonly DemoAccount[] = [
  { email: "j.aldaker@carrow.example", name: "Jorun Aldaker", part: "lead" },
  { email: "t.orevale@carrow.example", name: "Tamsin Orevale", part: "researcher" },
  { email: "w.castellane@carrow.example", name: "Wiremu Castellane", part: "co-author of a notebook" },
  { email: "p.marrash@carrow.example", name: "Pello Marrash", part: "reader of a notebook" },
  { email: "i.brandvold@carrow.example", name: "Ishani Brandvold", part: "researcher" },
];
