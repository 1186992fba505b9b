/** What a person is told of, as every room may ask. */
import { queryOptions } from "@tanstack/react-query";
import { noticesResponse } from "../../shared/schemas/notices";
import { api } from "./api";

export const noticesQuery = queryOptions({
  queryKey: ["notices"],
  queryFn: ({ signal }) => api.get("/notices", noticesResponse, { signal }),
  refetchInterval: 30_000,
  refetchOnWindowFocus: "always",
});
