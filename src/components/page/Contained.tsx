import { Component, type ReactNode } from "react";

interface ContainedProps {
  /** Opens the sentence that stands in its place, "Spread". */
  what: string;
  children: ReactNode;
}

/** What breaks inside says so there, and takes nothing else off the page: React would otherwise remove it all. */
export class Contained extends Component<ContainedProps, { broken: boolean }> {
  override state = { broken: false };

  static getDerivedStateFromError() {
    return { broken: true };
  }

  override render() {
    if (!this.state.broken) return this.props.children;
    return (
      <p className="fault" role="alert">
        <strong>{this.props.what} cannot be shown.</strong> The fault lies in Clatterbench, not in these values; nothing
        else on the page is lost. Close this and open it again, or go on without it.
      </p>
    );
  }
}
