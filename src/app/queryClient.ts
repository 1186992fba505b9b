import { QueryClient } from "@tanstack/react-query";
import { ApiError } from "../lib/ApiError";

/** Only a connection that failed is worth asking again; what the server said it will say again. */
function retry(failures: number, error: Error): boolean {
  return error instanceof ApiError && error.isOffline && failures < 2;
}

/** What the pages know of the server. A request is made even where the browser believes itself offline, so that the page can say so. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry, networkMode: "always", staleTime: 10_000 },
      mutations: { retry: false, networkMode: "always" },
    },
  });
}
