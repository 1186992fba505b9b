import { queryOptions, useQuery } from "@tanstack/react-query";
import { keptMailResponse, type KeptMailResponse } from "../../../shared/schemas/mail";
import { api } from "../../lib/api";
import { formatWhen } from "../../lib/format";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";

const keptMailQuery = queryOptions({
  queryKey: ["development", "mail"],
  queryFn: ({ signal }) => api.get("/development/mail", keptMailResponse, { signal }),
  refetchInterval: 5000,
});

/** Letters that would have gone out, where no mail server is set. */
export function KeptMailPage() {
  const mail = useQuery(keptMailQuery);
  if (mail.isPending) return <Opening what="the mail" />;
  if (mail.isError) return <ProblemPage error={mail.error} onRetry={() => void mail.refetch()} />;
  return (
    <Page title="Mail in development" width={820}>
      <AltitudeRule width={820} className="mt-44 wide:mt-52" />
      <h1 className="pt-28 type-display">Mail in development</h1>
      <p className="pt-8 text-ink2 italic">No mail server is set, so letters stay here. The last hundred.</p>
      {mail.data.length === 0 ? (
        <p className="pt-28 type-abstract">Nothing has been written to anyone yet.</p>
      ) : (
        <ul className="ruled-list mt-28">
          {mail.data.map((letter) => (
            <KeptLetter key={letter.id} letter={letter} />
          ))}
        </ul>
      )}
    </Page>
  );
}

function KeptLetter({ letter }: { letter: KeptMailResponse[number] }) {
  const { to, subject, plain, takenAt } = letter;
  return (
    <li className="py-18">
      <p className="flex flex-wrap justify-between gap-x-18 type-meta text-ink2">
        <span className="[overflow-wrap:anywhere]">to {to}</span>
        <time dateTime={takenAt}>{formatWhen(new Date(takenAt), new Date())}</time>
      </p>
      <h2 className="pt-2 font-serif text-[20px]/[26px] [overflow-wrap:anywhere]">{subject}</h2>
      <p className="max-w-[38em] pt-8 type-text [overflow-wrap:anywhere] whitespace-pre-line">
        {plain.split(/(https?:\/\/\S+)/).map((piece, index) =>
          index % 2 === 1 ? (
            <a key={index} href={piece}>
              {piece}
            </a>
          ) : (
            piece
          ),
        )}
      </p>
    </li>
  );
}
