import { useAccount } from "../lib/session";
import { ApiError } from "../lib/ApiError";
import { ProblemPage } from "../ui/ProblemPage";

const notFound = new ApiError({
  status: 404,
  code: "not_found",
  message: "There is no page at this address.",
});

/** An address that leads nowhere; the same words as for what one may not see. */
export function NotFoundPage() {
  return <ProblemPage error={notFound} email={useAccount()?.email} />;
}
