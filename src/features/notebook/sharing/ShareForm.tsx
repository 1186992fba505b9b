import { useState } from "react";
import type { ShareRole } from "../../../../shared/schemas/roles";
import { shareBody } from "../../../../shared/schemas/shares";
import { ApiError, failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { Field } from "../../../ui/Field";
import { useNotify } from "../../../ui/Notices";
import { WordMenu } from "../../../ui/WordMenu";
import { roleSentence, shareRoleOptions } from "./shareRoles";
import { useShare } from "./sharingQueries";

/** Shares the notebook with someone by their address; who has no account yet gets an invitation. */
export function ShareForm({ notebookId }: { notebookId: string }) {
  const [email, setEmail] = useState("");
  const [role, setRole] = useState<ShareRole>("commenter");
  const [complaint, setComplaint] = useState<string>();
  const share = useShare(notebookId);
  const notify = useNotify();
  const serverSays =
    share.error instanceof ApiError
      ? (share.error.issueAt("email") ?? failureSentence(share.error))
      : undefined;

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = shareBody.safeParse({ email, role });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    share.mutate(parsed.data, {
      onSuccess: () => {
        notify({ state: "holds", text: `Shared with ${parsed.data.email}, ${role}.` });
        setEmail("");
      },
    });
  }

  return (
    <form onSubmit={handleSubmit} noValidate aria-label="Share with someone" className="pt-18">
      <div className="flex flex-wrap items-start gap-x-18 gap-y-8">
        <Field
          label="Share with, by e-mail"
          type="email"
          placeholder="name@place.example"
          wrapperClassName="min-w-220 flex-1"
          value={email}
          onChange={(event) => {
            setEmail(event.target.value);
            setComplaint(undefined);
            if (share.isError) share.reset();
          }}
          fault={complaint ?? serverSays}
        />
        <div className="font-sans text-[15px]/[24px] mid:pt-26">
          as{" "}
          <WordMenu
            label="Role of the new reader"
            value={role}
            options={shareRoleOptions}
            onChange={setRole}
          />
        </div>
      </div>
      <div className="flex flex-wrap items-center gap-x-18 gap-y-8 pt-14">
        <Button tone="main" type="submit" busy={share.isPending}>
          Share
        </Button>
        <span className="type-label text-ink3">{roleSentence(role)}</span>
      </div>
    </form>
  );
}
