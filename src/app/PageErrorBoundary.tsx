import { Component } from "react";
import { useLocation } from "react-router-dom";
import { ApiError } from "../lib/ApiError";
import { Button } from "../ui/Button";
import { PageFrame } from "../ui/PageFrame";
import { ProblemPage } from "../ui/ProblemPage";
import { StatePage } from "../ui/StatePage";

interface PageErrorBoundaryProps {
  children: React.ReactNode;
  /** The bar is still over the page. */
  framed?: boolean;
}

/** Shows what can be done where a page broke, until another page is gone to. */
export function PageErrorBoundary({ children, framed = false }: PageErrorBoundaryProps) {
  const { pathname } = useLocation();
  return (
    <Boundary pathname={pathname} framed={framed}>
      {children}
    </Boundary>
  );
}

interface BoundaryProps extends Required<PageErrorBoundaryProps> {
  pathname: string;
}

interface BoundaryState {
  error: unknown;
  hasError: boolean;
  /** Where it broke: another page is given its chance. */
  pathname: string;
}

class Boundary extends Component<BoundaryProps, BoundaryState> {
  override state: BoundaryState = { error: null, hasError: false, pathname: this.props.pathname };

  static getDerivedStateFromError(error: unknown): Partial<BoundaryState> {
    return { error, hasError: true };
  }

  static getDerivedStateFromProps(props: BoundaryProps, state: BoundaryState): Partial<BoundaryState> | null {
    return props.pathname === state.pathname
      ? null
      : { hasError: false, error: null, pathname: props.pathname };
  }

  override render() {
    if (!this.state.hasError) return this.props.children;
    const page = <BrokenPage error={this.state.error} />;
    return this.props.framed ? page : <PageFrame places={[]}>{page}</PageFrame>;
  }
}

/** A page's code that could not be fetched: no connection, or the server has been given a newer Tenuity since. */
function isMissingCode(error: unknown): boolean {
  return error instanceof Error && /dynamically imported module|module script|preload/i.test(error.message);
}

function BrokenPage({ error }: { error: unknown }) {
  if (!isMissingCode(error)) return <ProblemPage error={error instanceof ApiError ? error : undefined} />;
  return (
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
  );
}
