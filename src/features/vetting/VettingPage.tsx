import { useQuery } from "@tanstack/react-query";
import type { VettingResponse } from "../../../shared/schemas/vettings";
import { formatDay } from "../../lib/format";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { CheckList } from "./CheckList";
import { Decision } from "./Decision";
import { useVettingActs, vettingQuery } from "./vettingQueries";

/** A version before its lead: what it would become, the checks, the decision. */
export function VettingPage({ vettingId, children }: { vettingId: string; children?: (vetting: VettingResponse) => React.ReactNode }) {
  const vetting = useQuery(vettingQuery(vettingId));
  const acts = useVettingActs(vettingId);
  if (vetting.isPending) return <Opening what="the checks" />;
  if (!vetting.data) return <ProblemPage error={vetting.error} onRetry={() => void vetting.refetch()} />;
  const found = vetting.data;
  const title = found.title || "Untitled";
  return (
    <Page title={`Vetting of ${title}`}>
      <div className="vetting-page">
        <div className="min-w-0">
          <AltitudeRule width={736} />
          <p className="kicker">
            <span>Vetting</span>
            <span>asked for on {formatDay(new Date(found.requestedAt), new Date())}</span>
            <span>would become {found.wouldBecome}</span>
          </p>
          <h1 className="type-display">{title}</h1>
          <p className="pt-8 font-serif text-ink2 italic">
            {found.authors.join(", ")}. Version {found.versionNumber}, “{found.version.message}”
          </p>
          <blockquote className="m-0 pt-18 font-serif text-[19px]/[30px] whitespace-pre-line">“{found.message}”</blockquote>
          <Standing vetting={found} />
          <CheckList
            checks={found.checks}
            onAccept={found.abilities.vet ? (accepted) => acts.accept.mutate(accepted) : null}
            isBusy={acts.accept.isPending}
          />
          <h2 className="pt-44 pb-8 type-section">What would be published</h2>
          <p className="max-w-[40em] whitespace-pre-line">{found.summary}</p>
          <p className="pt-8 type-label text-ink3">
            Licence {found.licence}; engine {found.version.engine}; content{" "}
            <span className="font-mono">{found.version.contentHash.slice(0, 12)}</span>
            {found.lastEdition && `; the last edition is ${found.lastEdition}`}
          </p>
        </div>
        {found.abilities.vet && found.state === "requested" && <Decision vetting={found} acts={acts} />}
      </div>
      {children?.(found)}
    </Page>
  );
}

function Standing({ vetting: { state, decidedBy, remarks } }: { vetting: VettingResponse }) {
  if (state === "requested") return null;
  const did = { returned: "returned it with remarks", approved: "approved and published it", taken_back: "took the request back" };
  return (
    <Message state={state === "approved" ? "holds" : "remark"} className="mt-18">
      {decidedBy?.name ?? "Someone"} {did[state]}.{remarks && ` “${remarks}”`}
    </Message>
  );
}
