import type { ActName, AuditLine } from "../../../shared/schemas/audit";
import { formatCount } from "../../lib/format";

/** What was done, in words; `subject` stands where its name goes. */
export type ActSentence = readonly (string | { subject: NonNullable<AuditLine["subject"]> })[];

type Say = (line: {
  subject: ActSentence[number];
  with: string;
  role: string;
  before: string;
  notebooks: string;
}) => ActSentence;

const was = (before: string): string => (before ? `; was ${before}` : "");
const as = (role: string): string => (role ? `, as ${role}` : "");

const sayings: Record<ActName, Say> = {
  group_founded: () => ["founded the group"],
  group_renamed: ({ subject, before }) => ["renamed the group ", subject, was(before)],
  invitation_sent: (line) => [`invited ${line.with}${as(line.role)}`],
  invitation_sent_again: (line) => [`sent the invitation of ${line.with} again`],
  invitation_changed: (line) => [
    `made the invitation of ${line.with} one as ${line.role}${was(line.before)}`,
  ],
  invitation_revoked: (line) => [`took back the invitation of ${line.with}`],
  invitation_accepted: ({ role }) => [`accepted the invitation${as(role)}`],
  role_set: ({ subject, role, before }) => ["made ", subject, ` ${role}${was(before)}`],
  member_removed: ({ subject, notebooks }) => ["removed ", subject, notebooks],
  member_left: ({ notebooks }) => ["left the group", notebooks],
  lead_handed_over: ({ subject }) => ["handed the lead over to ", subject],
  notebook_shared: (line) => ["shared ", line.subject, ...withWhom(line)],
  share_changed: (line) => ["changed the share of ", line.subject, ...withWhom(line), was(line.before)],
  share_taken_back: (line) => ["took ", line.subject, line.with ? ` back from ${line.with}` : " back"],
  share_given_up: ({ subject }) => ["gave up their part in ", subject],
  group_share_set: ({ subject, role, before }) => [
    "shared ",
    subject,
    ` with the group${as(role)}${was(before)}`,
  ],
  group_share_taken_back: ({ subject }) => ["took ", subject, " back from the group"],
  notebook_invitation_sent: (line) => ["shared ", line.subject, ...withWhom(line)],
  notebook_invitation_sent_again: (line) => [
    "sent an invitation to ",
    line.subject,
    line.with ? ` again, to ${line.with}` : " again",
  ],
  notebook_invitation_changed: (line) => [
    "changed an invitation to ",
    line.subject,
    ...withWhom(line),
    was(line.before),
  ],
  notebook_invitation_revoked: (line) => [
    "took back an invitation to ",
    line.subject,
    line.with ? `, of ${line.with}` : "",
  ],
  notebook_invitation_accepted: ({ subject, role }) => ["accepted the invitation to ", subject, as(role)],
  notebook_handed_over: (line) => ["handed ", line.subject, line.with ? ` over to ${line.with}` : " over"],
  notebook_duplicated: ({ subject }) => ["duplicated a notebook as ", subject],
  notebook_archived: ({ subject }) => ["archived ", subject],
  notebook_unarchived: ({ subject }) => ["took ", subject, " out of the archive"],
  notebook_moved_in: ({ subject }) => ["moved ", subject, " into the group"],
  notebook_moved_out: ({ subject }) => ["moved ", subject, " out of the group"],
  notebook_deleted: ({ subject }) => ["put ", subject, " in the bin"],
  vetting_requested: ({ subject }) => ["asked for ", subject, " to be vetted"],
  vetting_taken_back: ({ subject }) => ["took back the request to vet ", subject],
  vetting_returned: ({ subject }) => ["returned ", subject, " with remarks"],
  vetting_approved: (line) => ["approved ", line.subject, line.with ? ` and published it as ${line.with}` : ""],
  reference_withdrawn: (line) => ["withdrew ", line.with || "a reference", ", published from ", line.subject],
  reference_described: (line) => ["changed what is said of ", line.with || "a reference", ", published from ", line.subject],
  notebook_restored: ({ subject }) => ["took ", subject, " out of the bin"],
};

const withWhom = (line: { with: string; role: string }): string[] =>
  line.with ? [` with ${line.with}, ${line.role}`] : [];

export function actSentence({ act, subject, details }: AuditLine): ActSentence {
  const { notebooks = 0 } = details;
  const said = sayings[act]({
    subject: subject ? { subject } : "a private notebook",
    with: details.with ?? "",
    role: details.role ?? "",
    before: details.before ?? "",
    notebooks: notebooks > 0 ? `; ${formatCount(notebooks, "notebook")} went to ${details.with}` : "",
  });
  return said.filter((piece) => piece !== "");
}
