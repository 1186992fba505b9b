import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import { noticesResponse, type Notice } from "../../../shared/schemas/notices";
import { api } from "../../lib/api";
import { failureSentence } from "../../lib/ApiError";
import { formatCount, formatWhen } from "../../lib/format";
import { noticesQuery } from "../../lib/notices";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { StateMark } from "../../ui/StateMark";
import { TextButton } from "../../ui/TextButton";
import { ThinningAir } from "../../ui/ThinningAir";
import { noticeAddress, noticeWords } from "./noticesWords";

/** Marks notices as read; null: all of them. */
function useReadNotices() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (ids: string[] | null) => api.post("/notices/read", { ids }, noticesResponse),
    onSuccess: (fresh) => queryClient.setQueryData(noticesQuery.queryKey, fresh),
  });
}

/** What one is told of: mentions and replies, latest first. */
export function NoticesPage() {
  const found = useQuery(noticesQuery);
  const read = useReadNotices();
  if (found.isPending) return <Opening what="the notices" />;
  if (!found.data) return <ProblemPage error={found.error} onRetry={() => void found.refetch()} />;
  const { notices, unread } = found.data;

  return (
    <Page title="Notices" width={820}>
      <AltitudeRule width={820} className="mt-44 wide:mt-52" />
      <div className="flex flex-wrap items-baseline justify-between gap-x-28 gap-y-8 pt-28">
        <h1 className="type-display">Notices</h1>
        {unread > 0 && (
          <TextButton disabled={read.isPending} onClick={() => read.mutate(null)}>
            Mark all as read
          </TextButton>
        )}
      </div>
      <p className="pt-8 text-ink2 italic" role="status">
        {unread === 0 ? "Nothing new." : `To read: ${formatCount(unread, "notice")}.`}
      </p>
      {read.isError && (
        <Message state="fault" live="assertive" className="mt-18">
          Nothing was marked. {failureSentence(read.error)}
        </Message>
      )}
      {notices.length === 0 ? (
        <>
          <p className="max-w-[34em] py-28 type-abstract">
            When someone mentions you in a comment, or replies in a thread of yours, it stands here. Which of
            it also comes by mail you choose on your <Link to="/account">account page</Link>.
          </p>
          <ThinningAir width={820} height={220} />
        </>
      ) : (
        <ul className="ruled-list mt-28">
          {notices.map((notice) => (
            <NoticeLine key={notice.id} notice={notice} onRead={() => read.mutate([notice.id])} />
          ))}
        </ul>
      )}
    </Page>
  );
}

function NoticeLine({ notice, onRead }: { notice: Notice; onRead: () => void }) {
  const { isRead, at, excerpt, notebook } = notice;
  return (
    <li className="grid grid-cols-[11px_minmax(0,1fr)] items-baseline gap-x-12 py-12">
      <StateMark state={isRead ? "remark" : "waits"} label={isRead ? "read" : "to be read"} />
      <div className="min-w-0">
        <p className="flex flex-wrap items-baseline justify-between gap-x-18 type-meta text-ink2">
          <Link
            to={noticeAddress(notice)}
            className={`[overflow-wrap:anywhere] no-underline hover:underline ${isRead ? "" : "font-semibold"}`}
            onClick={() => !isRead && onRead()}
          >
            {noticeWords(notice)}
          </Link>
          <time dateTime={at}>{formatWhen(new Date(at), new Date())}</time>
        </p>
        <p className="type-text [overflow-wrap:anywhere]">{excerpt}</p>
        <p className="flex flex-wrap items-baseline gap-x-18 type-label text-ink3">
          <span className="[overflow-wrap:anywhere]">in “{notebook.title}”</span>
          {!isRead && (
            <TextButton aria-label={`Mark as read: ${noticeWords(notice)}`} onClick={onRead}>
              mark as read
            </TextButton>
          )}
        </p>
      </div>
    </li>
  );
}
