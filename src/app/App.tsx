import { QueryClientProvider } from "@tanstack/react-query";
import { useState } from "react";
import { RouterProvider } from "react-router-dom";
import { NoticesProvider } from "../ui/Notices";
import { createQueryClient } from "./queryClient";
import { createRouter } from "./router";

/** Everything that stands round the pages. */
export function App() {
  const [queryClient] = useState(createQueryClient);
  const [router] = useState(createRouter);
  return (
    <QueryClientProvider client={queryClient}>
      <NoticesProvider>
        <RouterProvider router={router} />
      </NoticesProvider>
    </QueryClientProvider>
  );
}
