import { QueryClientProvider } from "@tanstack/react-query";
import { render } from "@testing-library/react";
import { Suspense } from "react";
import { MemoryRouter, useLocation } from "react-router-dom";
import { vi } from "vitest";
import { createQueryClient } from "../../src/app/queryClient";
import { sessionQuery } from "../../src/lib/session";
import { NoticesProvider } from "../../src/ui/Notices";

function Address() {
  const { pathname, search } = useLocation();
  return <output data-testid="address">{`${pathname}${search}`}</output>;
}

interface Setting {
  at?: string;
  /** Who is signed in. */
  user?: { id: string; name: string; email: string };
}

/** Renders a page among the providers it stands in, at an address. */
export function renderPage(page: React.ReactNode, { at = "/", user }: Setting = {}) {
  vi.stubGlobal("matchMedia", () => ({
    matches: true,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  const queryClient = createQueryClient();
  queryClient.setDefaultOptions({ queries: { retry: false, networkMode: "always" } });
  if (user) queryClient.setQueryData(sessionQuery.queryKey, { user, demo: null });
  return render(
    <QueryClientProvider client={queryClient}>
      <NoticesProvider>
        <MemoryRouter initialEntries={[at]}>
          <Suspense fallback={null}>{page}</Suspense>
          <Address />
        </MemoryRouter>
      </NoticesProvider>
    </QueryClientProvider>,
  );
}
