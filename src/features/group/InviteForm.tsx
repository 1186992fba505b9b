import { useState } from "react";
import { inviteToGroupBody } from "../../../shared/schemas/invitations";
import type { GroupRole } from "../../../shared/schemas/roles";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Field } from "../../ui/Field";
import { useNotify } from "../../ui/Notices";
import { WordMenu } from "../../ui/WordMenu";
import { useInvite } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";

/** Invites someone by their address, whether they have an account or not. */
export function InviteForm({ groupId }: { groupId: string }) {
  const [email, setEmail] = useState("");
  const [role, setRole] = useState<GroupRole>("researcher");
  const [complaint, setComplaint] = useState<string>();
  const invite = useInvite(groupId);
  const notify = useNotify();
  const serverSays =
    invite.error instanceof ApiError
      ? (invite.error.issueAt("email") ?? failureSentence(invite.error))
      : undefined;

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = inviteToGroupBody.safeParse({ email, role });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    invite.mutate(parsed.data, {
      onSuccess: () => {
        notify({ state: "holds", text: `A letter is on its way to ${parsed.data.email}.` });
        setEmail("");
      },
    });
  }

  return (
    <form
      onSubmit={handleSubmit}
      noValidate
      aria-label="Invite someone"
      className="flex flex-wrap items-start gap-x-18 gap-y-12 pt-18"
    >
      <Field
        label="E-mail"
        type="email"
        placeholder="name@place.example"
        wrapperClassName="min-w-220 flex-1"
        value={email}
        onChange={(event) => {
          setEmail(event.target.value);
          setComplaint(undefined);
          if (invite.isError) invite.reset();
        }}
        fault={complaint ?? serverSays}
      />
      <div className="font-sans text-[15px]/[24px] mid:pt-26">
        as <WordMenu label="Role of the invited" value={role} options={groupRoleOptions} onChange={setRole} />
      </div>
      <Button type="submit" busy={invite.isPending} className="mid:mt-21">
        Invite
      </Button>
    </form>
  );
}
