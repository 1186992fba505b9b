import { Component, type ReactNode } from "react";

interface PartBoundaryProps {
  children: ReactNode;
  /** What stands in place of a part that broke or could not be fetched. */
  instead: ReactNode;
}

/** Keeps the failure of one part from taking the page with it. */
export class PartBoundary extends Component<PartBoundaryProps, { isBroken: boolean }> {
  override state = { isBroken: false };

  static getDerivedStateFromError(): { isBroken: boolean } {
    return { isBroken: true };
  }

  override render() {
    return this.state.isBroken ? this.props.instead : this.props.children;
  }
}
