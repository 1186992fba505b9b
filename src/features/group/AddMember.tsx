import { useState } from "react";
import { addMemberBody } from "../../../shared/schemas/groups";
import type { GroupRole } from "../../../shared/schemas/roles";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Field } from "../../ui/Field";
import { useNotify } from "../../ui/Notices";
import { WordMenu } from "../../ui/WordMenu";
import { useAddMember } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";

/** Adds someone who has an account, by their address. */
export function AddMember({ groupId }: { groupId: string }) {
  const [email, setEmail] = useState("");
  const [role, setRole] = useState<GroupRole>("researcher");
  const [complaint, setComplaint] = useState<string>();
  const add = useAddMember(groupId);
  const notify = useNotify();
  const serverSays =
    add.error instanceof ApiError ? (add.error.issueAt("email") ?? failureSentence(add.error)) : undefined;

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = addMemberBody.safeParse({ email, role });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    add.mutate(parsed.data, {
      onSuccess: () => {
        notify({ state: "holds", text: `${parsed.data.email} is now ${role} here.` });
        setEmail("");
      },
    });
  }

  return (
    <section className="pt-44" aria-labelledby="add-member-heading">
      <h2 id="add-member-heading" className="pb-8 type-section">
        Add a member
      </h2>
      <form onSubmit={handleSubmit} noValidate className="flex flex-wrap items-start gap-x-18 gap-y-12">
        <Field
          label="E-mail of their account"
          type="email"
          placeholder="name@place.example"
          wrapperClassName="min-w-220 flex-1"
          value={email}
          onChange={(event) => {
            setEmail(event.target.value);
            setComplaint(undefined);
            if (add.isError) add.reset();
          }}
          fault={complaint ?? serverSays}
        />
        <div className="pt-26 font-sans text-[15px]/[24px]">
          as{" "}
          <WordMenu
            label="Role of the new member"
            value={role}
            options={groupRoleOptions}
            onChange={setRole}
          />
        </div>
        <Button type="submit" busy={add.isPending} className="mt-21">
          Add
        </Button>
      </form>
    </section>
  );
}
