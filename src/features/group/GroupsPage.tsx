import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { Link, useNavigate } from "react-router-dom";
import { createGroupBody } from "../../../shared/schemas/groups";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { formatCount } from "../../lib/format";
import { Button } from "../../ui/Button";
import { Field } from "../../ui/Field";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { groupsQuery, useFoundGroup } from "./groupQueries";

/** The groups one is in, and founding another. */
export function GroupsPage() {
  const groups = useQuery(groupsQuery);
  if (groups.isPending) return <Opening what="your groups" />;
  if (groups.isError) return <ProblemPage error={groups.error} onRetry={() => void groups.refetch()} />;

  return (
    <Page title="Groups" width={955}>
      <AltitudeRule width={955} className="mt-44 wide:mt-52" />
      <h1 className="pt-28 type-display">Groups</h1>
      <p className="pt-8 text-ink2 italic">People who share notebooks</p>
      {groups.data.length === 0 ? (
        <p className="max-w-[34em] pt-28 type-abstract">
          You are in no group yet. A lead can invite you by your e-mail address, or you can found one and be
          its lead.
        </p>
      ) : (
        <ul className="ruled-list mt-28">
          {groups.data.map((group) => (
            <li
              key={group.id}
              className="grid grid-cols-[84px_minmax(0,1fr)] items-baseline gap-x-18 py-12 wide:grid-cols-[120px_minmax(0,1fr)_140px_120px]"
            >
              <span className="font-serif text-[28px]/[32px] font-light">{group.code}</span>
              <Link
                to={`/groups/${group.id}`}
                className="font-serif text-[20px]/[26px] text-ink no-underline hover:underline"
              >
                {group.name}
              </Link>
              <span className="col-start-2 type-meta text-ink2 wide:col-start-auto">
                you are {group.role}
              </span>
              <span className="col-start-2 type-meta text-ink2 wide:col-start-auto wide:text-right">
                {formatCount(group.members, "member")}
              </span>
            </li>
          ))}
        </ul>
      )}
      <FoundGroup />
    </Page>
  );
}

function FoundGroup() {
  const [name, setName] = useState("");
  const [code, setCode] = useState("");
  const [complaints, setComplaints] = useState<{ name?: string; code?: string }>({});
  const found = useFoundGroup();
  const navigate = useNavigate();
  const serverSays = found.error instanceof ApiError ? found.error : null;
  const isAboutFields = Boolean(serverSays?.issueAt("name") ?? serverSays?.issueAt("code"));

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = createGroupBody.safeParse({ name, code });
    if (!parsed.success) {
      const messageAt = (field: string) =>
        parsed.error.issues.find((issue) => issue.path[0] === field)?.message;
      setComplaints({ name: messageAt("name"), code: messageAt("code") });
      return;
    }
    found.mutate(parsed.data, { onSuccess: (group) => void navigate(`/groups/${group.id}`) });
  }

  return (
    <section className="pt-64" aria-labelledby="found-heading">
      <h2 id="found-heading" className="type-section">
        Found a group
      </h2>
      {found.isError && !isAboutFields && (
        <Message state="fault" live="assertive" className="mt-12 max-w-[640px]">
          {failureSentence(found.error)}
        </Message>
      )}
      <form
        onSubmit={handleSubmit}
        noValidate
        className="grid max-w-[640px] items-start gap-18 pt-12 mid:grid-cols-[minmax(0,1fr)_160px]"
      >
        <Field
          label="Name"
          maxLength={120}
          value={name}
          onChange={(event) => {
            setName(event.target.value);
            setComplaints({ ...complaints, name: undefined });
          }}
          fault={complaints.name ?? serverSays?.issueAt("name")}
        />
        <Field
          label="Code"
          maxLength={5}
          autoCapitalize="characters"
          spellCheck={false}
          value={code}
          onChange={(event) => {
            setCode(event.target.value.toUpperCase());
            setComplaints({ ...complaints, code: undefined });
          }}
          fault={complaints.code ?? serverSays?.issueAt("code")}
          hint="2 to 5 capital letters; it does not change."
        />
        <div className="mid:col-span-2">
          <Button type="submit" busy={found.isPending}>
            Found the group
          </Button>
        </div>
      </form>
    </section>
  );
}
