import { useRouteError } from "react-router-dom";
import { ApiError } from "../lib/ApiError";
import { PageFrame } from "../ui/PageFrame";
import { ProblemPage } from "../ui/ProblemPage";
import { Button } from "../ui/Button";
import { StatePage } from "../ui/StatePage";

/** A page's code that could not be fetched: no connection, or the server has been given a newer Tenuity since. */
function isMissingCode(error: unknown): boolean {
  return error instanceof Error && /dynamically imported module|module script|preload/i.test(error.message);
}

/** What stands where a page broke. `framed` says that the bar is still over it. */
export function RouteErrorPage({ framed = false }: { framed?: boolean }) {
  const error = useRouteError();
  const page = isMissingCode(error) ? (
    <StatePage
      title="This page could not be fetched"
      isFault
      ways={
        <Button tone="main" onClick={() => window.location.reload()}>
          Load again
        </Button>
      }
    >
      <p>
        Either there is no connection, or the server has been given a newer Tenuity since this one was opened.
        Loading the page again settles both; what was saved is safe.
      </p>
    </StatePage>
  ) : (
    <ProblemPage error={error instanceof ApiError ? error : undefined} />
  );
  return framed ? page : <PageFrame places={[]}>{page}</PageFrame>;
}
