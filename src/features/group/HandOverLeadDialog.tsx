import { useState } from "react";
import type { GroupResponse } from "../../../shared/schemas/groups";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { useNotify } from "../../ui/Notices";
import { WordMenu } from "../../ui/WordMenu";
import { useHandOverLead } from "./groupQueries";

/** Makes another member lead in one's place. */
export function HandOverLeadDialog({ group, onClose }: { group: GroupResponse; onClose: () => void }) {
  const handOver = useHandOverLead(group.id);
  const notify = useNotify();
  const options = group.memberList
    .filter(({ role }) => role !== "lead")
    .map(({ user, role }) => ({ value: user.id, label: user.name, hint: role }));
  const [heirId, setHeirId] = useState(options[0]?.value ?? "");
  const heir = options.find(({ value }) => value === heirId);

  function handleHandOver() {
    handOver.mutate(heirId, {
      onSuccess: () => {
        notify({ state: "holds", text: `${heir?.label} now leads ${group.name}; you are a researcher.` });
        onClose();
      },
    });
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Hand ${group.name} over`}
      description="You stay in the group as a researcher. Only a lead can make you one again."
    >
      {heir ? (
        <p className="pt-18 font-serif text-[20px]/[32px]">
          Lead in my place is{" "}
          <WordMenu label="Who leads" value={heirId} options={options} onChange={setHeirId} />
        </p>
      ) : (
        <p className="pt-18 type-text">Everyone here is a lead already. Change your own role instead.</p>
      )}
      {handOver.isError && (
        <p role="alert" className="pt-12 type-meta text-redline">
          {failureSentence(handOver.error)}
        </p>
      )}
      <DialogActions>
        {heir && (
          <Button tone="fault" onClick={handleHandOver} busy={handOver.isPending}>
            Hand over
          </Button>
        )}
        <Button onClick={onClose}>Keep</Button>
      </DialogActions>
    </Dialog>
  );
}
