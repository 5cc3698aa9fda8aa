import { Component, type ErrorInfo, type ReactNode } from 'react';
import { Button } from '../ui/button';
import { DeadEnd } from '../ui/dead-end';

interface Props {
  /** Another value is another page: a fault in the one before is over then. */
  readonly page: string;
  readonly children: ReactNode;
}

interface State {
  readonly failed: boolean;
  readonly page: string;
}

/** Shown in place of a page that threw: a fault of ours, or a part of the program that could not be fetched. */
export class ErrorBoundary extends Component<Props, State> {
  override state: State = { failed: false, page: this.props.page };

  static getDerivedStateFromError(): Partial<State> {
    return { failed: true };
  }

  static getDerivedStateFromProps(props: Props, state: State): State | null {
    return props.page === state.page ? null : { failed: false, page: props.page };
  }

  override componentDidCatch(error: Error, info: ErrorInfo) {
    console.error(error, info.componentStack);
  }

  override render() {
    if (!this.state.failed) return this.props.children;
    return (
      <DeadEnd
        title="This page stopped working"
        action={<Button onClick={() => window.location.reload()}>Load it again</Button>}
      >
        <p>
          The fault is ours. What was drawn and sent is safe on the server. Load the page again; if it stops again, tell
          whoever runs this server what you did last.
        </p>
      </DeadEnd>
    );
  }
}
