import { useState } from "react";
import type { SharesResponse } from "../../../../shared/schemas/shares";
import { failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { DialogActions } from "../../../ui/Dialog";
import { useNotify } from "../../../ui/Notices";
import { WordMenu } from "../../../ui/WordMenu";
import { useHandOverNotebook } from "./sharingQueries";

interface HandOverNotebookProps {
  notebookId: string;
  people: SharesResponse["people"];
  isInGroup: boolean;
  onDone: () => void;
}

/** Makes someone whom the notebook is shared with its owner. */
export function HandOverNotebook({ notebookId, people, isInGroup, onDone }: HandOverNotebookProps) {
  const handOver = useHandOverNotebook(notebookId);
  const notify = useNotify();
  const options = people
    .filter(({ groupRole }) => !isInGroup || groupRole === "lead" || groupRole === "researcher")
    .map(({ user, role }) => ({ value: user.id, label: user.name, hint: role }));
  const [heirId, setHeirId] = useState(options[0]?.value ?? "");
  const heir = options.find(({ value }) => value === heirId);

  function handleHandOver() {
    handOver.mutate(heirId, {
      onSuccess: () => {
        notify({ state: "holds", text: `${heir?.label} owns it now; you are a co-author.` });
        onDone();
      },
    });
  }

  return (
    <div className="mt-12 border-t-[1.5px] border-ink pt-18">
      {heir ? (
        <>
          <p className="font-serif text-[20px]/[32px]">
            Its owner in my place is{" "}
            <WordMenu label="The new owner" value={heirId} options={options} onChange={setHeirId} />
          </p>
          <p className="pt-4 type-meta text-ink2">
            You stay as a co-author. Only the new owner can hand it back.
          </p>
        </>
      ) : (
        <p className="type-text">
          {isInGroup
            ? "Share it in person with a lead or a researcher of its group first; it can be handed over to them."
            : "Share it with someone in person first; it can be handed over to them."}
        </p>
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
        <Button onClick={onDone}>Keep it</Button>
      </DialogActions>
    </div>
  );
}
