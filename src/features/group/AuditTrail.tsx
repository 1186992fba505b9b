import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { Link } from "react-router-dom";
import type { AuditLine } from "../../../shared/schemas/audit";
import type { GroupMember } from "../../../shared/schemas/groups";
import { failureSentence } from "../../lib/ApiError";
import { formatCount, formatWhen } from "../../lib/format";
import { Message } from "../../ui/Message";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import { actSentence } from "./actSentence";
import { auditAddress, auditTrailQuery, type AuditFilters } from "./auditQueries";

const day = 86_400_000;
const anyone = "anyone";
type Kind = "anything" | "people" | "notebooks";
type Since = "beginning" | "week" | "month" | "year";

const kinds: readonly { value: Kind; label: string }[] = [
  { value: "anything", label: "anything" },
  { value: "people", label: "people" },
  { value: "notebooks", label: "notebooks" },
];
const times: readonly { value: Since; label: string }[] = [
  { value: "beginning", label: "the beginning" },
  { value: "week", label: "a week ago" },
  { value: "month", label: "a month ago" },
  { value: "year", label: "a year ago" },
];
const lengths: Record<Since, number | null> = { beginning: null, week: 7, month: 30, year: 365 };

/** What has happened in the group, for its leads: a sentence to filter it, lines latest first. */
export function AuditTrail({ groupId, members }: { groupId: string; members: readonly GroupMember[] }) {
  const [person, setPerson] = useState(anyone);
  const [kind, setKind] = useState<Kind>("anything");
  const [since, setSince] = useState<Since>("beginning");
  const filters = useMemo<AuditFilters>(() => {
    const days = lengths[since];
    return {
      ...(person === anyone ? {} : { person }),
      ...(kind === "anything" ? {} : { kind }),
      ...(days === null ? {} : { from: new Date(Date.now() - days * day).toISOString() }),
    };
  }, [person, kind, since]);
  const trail = useInfiniteQuery({
    ...auditTrailQuery(groupId, filters),
    placeholderData: keepPreviousData,
  });
  const people = [
    { value: anyone, label: "anyone" },
    ...members.map(({ user }) => ({ value: user.id, label: user.name })),
  ];
  const lines = trail.data?.pages.flatMap((page) => page.lines) ?? [];
  const total = trail.data?.pages[0]?.total ?? 0;
  const now = new Date();

  return (
    <section className="pt-44" aria-labelledby="audit-heading">
      <h2 id="audit-heading" className="pb-4 type-section">
        What has happened
      </h2>
      <p data-print="never" className="pb-10 font-serif text-[19px]/[32px]">
        Everything by <WordMenu label="By whom" value={person} options={people} onChange={setPerson} /> to{" "}
        <WordMenu label="To what" value={kind} options={kinds} onChange={setKind} /> since{" "}
        <WordMenu label="Since when" value={since} options={times} onChange={setSince} />
      </p>
      {trail.isError && (
        <Message
          state="fault"
          live="polite"
          action={<TextButton onClick={() => void trail.refetch()}>Try again</TextButton>}
        >
          {failureSentence(trail.error)}
        </Message>
      )}
      {lines.length > 0 && (
        <ol className="ruled-list" aria-label="What has happened, latest first" aria-busy={trail.isFetching}>
          {lines.map((line) => (
            <ActLine key={line.id} line={line} now={now} />
          ))}
        </ol>
      )}
      {trail.data && lines.length === 0 && (
        <p className="border-t-[1.5px] border-ink pt-12 type-comment text-ink2">Nothing of this kind.</p>
      )}
      <p className="flex flex-wrap gap-x-12 pt-12 type-label text-ink3">
        <span role="status">
          {trail.isPending ? "Reading what has happened…" : countSentence(lines.length, total)}
        </span>
        {trail.hasNextPage && (
          <TextButton
            className="text-[13px]/[18px]"
            disabled={trail.isFetchingNextPage}
            onClick={() => void trail.fetchNextPage()}
          >
            Earlier
          </TextButton>
        )}
        {total > 0 && (
          <a
            href={`/api/groups/${groupId}/audit.csv${auditAddress(filters)}`}
            download
            className="font-medium"
            aria-label="All these lines as a CSV file"
          >
            CSV
          </a>
        )}
      </p>
    </section>
  );
}

function ActLine({ line, now }: { line: AuditLine; now: Date }) {
  const at = new Date(line.at);
  return (
    <li className="grid gap-x-18 py-9 mid:grid-cols-[128px_minmax(0,1fr)] mid:items-baseline">
      <time dateTime={line.at} title={at.toLocaleString("en-GB")} className="type-meta text-ink2">
        {formatWhen(at, now)}
      </time>
      <span className="min-w-0 font-serif text-[17px]/[24px] [overflow-wrap:anywhere]">
        <b className="font-sans text-[14px]/[22px] font-semibold">{line.by?.name ?? "the server"}</b>{" "}
        {actSentence(line).map((piece, index) =>
          typeof piece === "string" ? (
            piece
          ) : piece.subject.kind === "notebook" ? (
            <Link key={index} to={`/notebooks/${piece.subject.id}`}>
              {piece.subject.name}
            </Link>
          ) : (
            piece.subject.name
          ),
        )}
      </span>
    </li>
  );
}

function countSentence(shown: number, total: number): string {
  if (total === 0) return "";
  const words = formatCount(total, "line");
  if (shown >= total) return `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;
  return `${shown} of ${words}.`;
}
