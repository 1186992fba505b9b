import { useQuery } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { failureSentence } from "../../../lib/ApiError";
import { Message } from "../../../ui/Message";
import { TextButton } from "../../../ui/TextButton";
import { notebookVettingsQuery, useTakeBackVetting } from "./vettingRequests";

/** Where the last request of a notebook stands: waiting, returned with remarks, or published. */
export function VettingStanding({ notebook }: { notebook: NotebookResponse }) {
  const [last] = useQuery(notebookVettingsQuery(notebook.id)).data ?? [];
  const takeBack = useTakeBackVetting(notebook.id);
  if (!last || last.state === "taken_back") return null;
  const version = `Version ${last.versionNumber}`;
  const checks = <Link to={`/vetting/${last.id}`}>the checks</Link>;
  if (last.state === "requested")
    return (
      <Message
        state="waits"
        className="mb-18"
        action={
          notebook.abilities.requestVetting && (
            <TextButton onClick={() => takeBack.mutate(last.id)}>Take the request back</TextButton>
          )
        }
      >
        {version} is in vetting, as {last.wouldBecome}. See {checks}.
        {takeBack.isError && ` ${failureSentence(takeBack.error)}`}
      </Message>
    );
  if (last.state === "returned")
    return (
      <Message state="caution" className="mb-18">
        {last.decidedBy?.name ?? "The lead"} returned version {last.versionNumber} with remarks: “{last.remarks}” See{" "}
        {checks}.
      </Message>
    );
  return (
    <Message state="holds" className="mb-18">
      {version} was approved by {last.decidedBy?.name ?? "the lead"} and published.{" "}
      <Link to="/references">References</Link>
    </Message>
  );
}
