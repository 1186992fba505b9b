import { Link } from "react-router-dom";
import { ApiError, failureSentence } from "../lib/ApiError";
import { Button } from "./Button";
import { StatePage } from "./StatePage";

interface ProblemPageProps {
  error: unknown;
  /** Asks once more; without it the page is loaded again. */
  onRetry?: () => void;
  /** The address of the person signed in, to whom a page could be shared. */
  email?: string;
}

/** The page that stands where another one could not be had: not found, refused, no connection, failed. */
export function ProblemPage({ error, onRetry, email }: ProblemPageProps) {
  const retry = onRetry ?? (() => window.location.reload());
  const toNotebooks = <Link to="/notebooks">Notebooks</Link>;

  if (error instanceof ApiError && error.status === 404) {
    return (
      <StatePage number={404} title="Not found" ways={toNotebooks}>
        <p>
          There is no page at this address, or it isn’t open to you.
          {email && ` Who sent it can share it with ${email}.`}
        </p>
      </StatePage>
    );
  }
  if (error instanceof ApiError && error.status === 403) {
    return (
      <StatePage number={403} title="Not allowed" ways={toNotebooks}>
        <p>{error.message}</p>
      </StatePage>
    );
  }
  if (error instanceof ApiError && error.isOffline) {
    return (
      <StatePage
        title="No connection"
        isFault
        ways={
          <>
            <Button tone="main" onClick={retry}>
              Try now
            </Button>
            {toNotebooks}
          </>
        }
      >
        <p>{error.message} What was saved is safe.</p>
      </StatePage>
    );
  }
  return (
    <StatePage
      title="This page failed"
      isFault
      ways={
        <>
          <Button tone="main" onClick={retry}>
            Try again
          </Button>
          {toNotebooks}
        </>
      }
    >
      <p>{failureSentence(error)}</p>
      {error instanceof ApiError && error.requestId && (
        <p className="pt-8 type-meta text-ink3">
          Whoever runs this server finds it under request {error.requestId}.
        </p>
      )}
    </StatePage>
  );
}
