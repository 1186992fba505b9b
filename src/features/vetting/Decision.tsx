import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { VettingResponse } from "../../../shared/schemas/vettings";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Message } from "../../ui/Message";
import { useNotify } from "../../ui/Notices";
import { TextArea } from "../../ui/TextArea";
import type { useVettingActs } from "./vettingQueries";

interface DecisionProps {
  vetting: VettingResponse;
  acts: ReturnType<typeof useVettingActs>;
}

/** Return with remarks, or approve, which publishes. What can't be done yet says what would open it. */
export function Decision({ vetting, acts: { sendBack, approve } }: DecisionProps) {
  const navigate = useNavigate();
  const notify = useNotify();
  const [remarks, setRemarks] = useState("");
  const [fault, setFault] = useState<string | undefined>(undefined);
  const [isPublic, setPublic] = useState(false);
  const open = vetting.checks.filter(({ verdict }) => verdict !== "holds").length;
  const error = sendBack.error ?? approve.error;

  const handleReturn = () => {
    if (remarks.trim() === "") return setFault("Remarks are needed: say what is asked for.");
    setFault(undefined);
    sendBack.mutate(remarks, {
      onSuccess: () => {
        notify({ state: "holds", text: "Returned with remarks." });
        void navigate("/vetting");
      },
    });
  };
  const handleApprove = () =>
    approve.mutate(
      { isPublic, doi: null },
      {
        onSuccess: ({ pin }) => {
          notify({ state: "holds", text: `Published as ${pin}.` });
          void navigate(`/references/${pin}`);
        },
      },
    );

  return (
    <aside className="decision" aria-labelledby="decision-heading">
      <h2 id="decision-heading" className="type-section">
        Decision
      </h2>
      <p className="pb-14 text-ink2">
        {open === 0
          ? "Every check holds. Approving publishes in the same act."
          : `${open === 1 ? "One check does" : `${open} checks do`} not hold yet. Approving publishes in the same act, and opens only when all hold.`}
      </p>
      <TextArea
        label={`Remarks to ${vetting.requestedBy.name}`}
        value={remarks}
        maxLength={4000}
        rows={6}
        fault={fault}
        onChange={(event) => setRemarks(event.target.value)}
      />
      <div className="flex flex-col gap-10 pt-14">
        <Button tone={open === 0 ? "plain" : "main"} busy={sendBack.isPending} onClick={handleReturn}>
          Return with remarks
        </Button>
        <label className="flex items-baseline gap-8 type-label">
          <input type="checkbox" checked={isPublic} onChange={(event) => setPublic(event.target.checked)} />
          It may be read without an account
        </label>
        <Button tone="main" disabled={open > 0} busy={approve.isPending} onClick={handleApprove}>
          Approve and publish
        </Button>
      </div>
      {error && (
        <Message state="fault" live="assertive" className="mt-18">
          {failureSentence(error)}
        </Message>
      )}
    </aside>
  );
}
