import { QueryClientProvider } from "@tanstack/react-query";
import { useState } from "react";
import { BrowserRouter } from "react-router-dom";
import { NoticesProvider } from "../ui/Notices";
import { PageErrorBoundary } from "./PageErrorBoundary";
import { Pages } from "./Pages";
import { createQueryClient } from "./queryClient";

/** Everything that stands round the pages. */
export function App() {
  const [queryClient] = useState(createQueryClient);
  return (
    <QueryClientProvider client={queryClient}>
      <NoticesProvider>
        <BrowserRouter>
          <PageErrorBoundary>
            <Pages />
          </PageErrorBoundary>
        </BrowserRouter>
      </NoticesProvider>
    </QueryClientProvider>
  );
}
