import { queryOptions, useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import {
  choosableMailKinds,
  mailChoicesResponse,
  type ChoosableMailKind,
  type SetMailChoiceBody,
} from "../../../shared/schemas/mail";
import { failureSentence } from "../../lib/ApiError";
import { api } from "../../lib/api";
import { Message } from "../../ui/Message";
import { TextButton } from "../../ui/TextButton";

const mailChoicesQuery = queryOptions({
  queryKey: ["account", "mail"],
  queryFn: ({ signal }) => api.get("/account/mail", mailChoicesResponse, { signal }),
});

const labels: Record<ChoosableMailKind, string> = {
  group_invitation: "invitations to a group",
  notebook_invitation: "notebooks shared with me",
  mention: "mentions of me in comments",
  reply: "replies to my comments",
  vetting_requested: "requests to vet a version",
  vetting_returned: "versions returned with remarks",
  vetting_approved: "versions approved and published",
  new_edition: "new editions of references that I use",
};

/** Which letters one wants. Each switch holds at once. */
export function MailChoices() {
  const queryClient = useQueryClient();
  const choices = useQuery(mailChoicesQuery);
  const change = useMutation({
    mutationFn: (body: SetMailChoiceBody) => api.patch("/account/mail", body, mailChoicesResponse),
    onSuccess: (next) => queryClient.setQueryData(mailChoicesQuery.queryKey, next),
  });

  if (choices.isPending) return <p className="type-meta text-ink2">Reading what you have chosen…</p>;
  if (choices.isError) {
    return (
      <Message
        state="fault"
        live="polite"
        action={<TextButton onClick={() => void choices.refetch()}>Try again</TextButton>}
      >
        {failureSentence(choices.error)}
      </Message>
    );
  }
  return (
    <div>
      <fieldset className="m-0 grid gap-8 border-0 p-0">
        <legend className="pb-4 type-meta text-ink2">Write to me about</legend>
        {choosableMailKinds.map((kind) => (
          <label key={kind} className="flex items-baseline gap-8 font-sans text-[14.5px]/[22px]">
            <input
              type="checkbox"
              className="check-box"
              checked={choices.data[kind]}
              disabled={change.isPending}
              onChange={(event) => change.mutate({ kind, isWanted: event.target.checked })}
            />
            {labels[kind]}
          </label>
        ))}
      </fieldset>
      <p className="pt-8 type-label text-ink3">
        Letters that keep the account safe are always sent: to confirm an address and to set a new password.
      </p>
      {change.isError && (
        <Message state="fault" live="assertive" className="mt-12">
          {failureSentence(change.error)}
        </Message>
      )}
    </div>
  );
}
