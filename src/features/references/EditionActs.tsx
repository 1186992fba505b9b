import { useState } from "react";
import type { ReferenceResponse } from "../../../shared/schemas/references";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { Field } from "../../ui/Field";
import { Message } from "../../ui/Message";
import { TextButton } from "../../ui/TextButton";
import { useReferenceActs } from "./referenceQueries";

/** What a lead may do with an edition: say who may read it, give its DOI, withdraw it. */
export function EditionActs({ reference: { pin, isPublic, doi, abilities } }: { reference: ReferenceResponse }) {
  const { withdraw, describe } = useReferenceActs(pin);
  const [isWithdrawing, setWithdrawing] = useState(false);
  const [reason, setReason] = useState("");
  const [writtenDoi, setWrittenDoi] = useState(doi ?? "");
  if (!abilities.describe && !abilities.withdraw) return null;
  const error = describe.error ?? withdraw.error;
  return (
    <div data-print="never" className="flex flex-wrap items-end gap-18 pt-18">
      <Field label="DOI" value={writtenDoi} maxLength={200} onChange={(event) => setWrittenDoi(event.target.value)} />
      <Button busy={describe.isPending} onClick={() => describe.mutate({ doi: writtenDoi.trim() || null })}>
        Set the DOI
      </Button>
      <TextButton onClick={() => describe.mutate({ isPublic: !isPublic })}>
        {isPublic ? "Let only the group read it" : "Let it be read without an account"}
      </TextButton>
      {abilities.withdraw && <TextButton onClick={() => setWithdrawing(true)}>Withdraw</TextButton>}
      {error && (
        <Message state="fault" live="assertive" className="w-full">
          {failureSentence(error)}
        </Message>
      )}
      <Dialog
        open={isWithdrawing}
        onOpenChange={setWithdrawing}
        title={`Withdraw ${pin}`}
        description="Its page stays, with the reason. Notebooks that use it keep its numbers and are told. This cannot be undone."
      >
        <form
          className="pt-18"
          onSubmit={(event) => {
            event.preventDefault();
            withdraw.mutate(reason, { onSuccess: () => setWithdrawing(false) });
          }}
        >
          <Field
            label="Reason, for everyone to read"
            value={reason}
            required
            maxLength={1000}
            onChange={(event) => setReason(event.target.value)}
          />
          <DialogActions>
            <Button type="submit" tone="fault" busy={withdraw.isPending}>
              Withdraw
            </Button>
            <TextButton onClick={() => setWithdrawing(false)}>Keep it</TextButton>
          </DialogActions>
        </form>
      </Dialog>
    </div>
  );
}
