import { useQuery } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import type { ReferenceResponse } from "../../../shared/schemas/references";
import { formatDay } from "../../lib/format";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { AboutEdition } from "./AboutEdition";
import { PublishedCautions } from "./PublishedCautions";
import { PublishedValues } from "./PublishedValues";
import { referenceQuery } from "./referenceQueries";
import { ReferenceStanding } from "./ReferenceStanding";
import "./references.css";

interface ReferencePageProps {
  pin: string;
  /** The published notebook as an article, which another feature sets. */
  article: (reference: ReferenceResponse) => React.ReactNode;
}

/** One published edition: what it says, its values by name, its article, and how to cite and use it. */
export function ReferencePage({ pin, article }: ReferencePageProps) {
  const reference = useQuery(referenceQuery(pin));
  if (reference.isPending) return <Opening what="the reference" />;
  if (!reference.data) return <ProblemPage error={reference.error} onRetry={() => void reference.refetch()} />;
  const found = reference.data;
  const newest = found.editions.find(({ state }) => state === "current");
  return (
    <Page title={`${found.group.code} ${found.number}, edition ${found.edition}`} width={880}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-18 pt-44 pb-14">
        <p className="reference-number">
          {found.group.code} {found.number} <span>edition {found.edition}</span>
        </p>
        <p className="type-label">
          <ReferenceStanding state={found.state} />
        </p>
      </div>
      <AltitudeRule width={880} />
      {found.withdrawn && (
        <Message state="fault" className="mt-18">
          Withdrawn on {formatDay(new Date(found.withdrawn.at), new Date())}: {found.withdrawn.reason}
        </Message>
      )}
      {found.state === "superseded" && newest && (
        <Message state="remark" className="mt-18">
          <Link to={`/references/${newest.pin}`}>Edition {newest.edition}</Link> supersedes this one.
        </Message>
      )}
      <h1 className="pt-28 type-display">{found.title}</h1>
      <p className="pt-8 font-serif text-ink2 italic">
        {namesInWords(found.authors)}, of {found.group.name}
      </p>
      <p className="max-w-[40em] pt-18 font-serif text-[19px]/[30px] whitespace-pre-line">{found.summary}</p>
      <PublishedValues pin={found.pin} cells={found.result.cells} />
      <PublishedCautions reference={found} />
      {article(found)}
      <AboutEdition reference={found} />
    </Page>
  );
}

function namesInWords(names: readonly string[]): string {
  if (names.length < 2) return names.join("");
  return `${names.slice(0, -1).join(", ")} and ${names[names.length - 1]}`;
}
