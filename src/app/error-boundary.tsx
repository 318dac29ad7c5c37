import { Component, type ReactNode } from "react";
import { Button } from "../ui/button.tsx";
import { Notice } from "../ui/notice.tsx";

interface State {
  failed: boolean;
}

interface Props {
  /** Where the rider is; going elsewhere gives the screen another try. */
  place?: string;
  children: ReactNode;
}

/** The last resort: whatever a screen threw, what was saved is still on this phone. */
export class ErrorBoundary extends Component<Props, State> {
  override state: State = { failed: false };

  static getDerivedStateFromError(): State {
    return { failed: true };
  }

  override componentDidUpdate(before: Props) {
    if (this.state.failed && before.place !== this.props.place) this.setState({ failed: false });
  }

  override render() {
    if (!this.state.failed) return this.props.children;
    return (
      <main className="mx-auto flex w-full max-w-xl flex-col gap-4 p-4">
        <h1 className="text-3xl">This screen could not be shown</h1>
        <Notice tone="error" title="Something in the app went wrong">
          <p>
            Everything that was saved is still on this phone. Load the page again; with no network,
            a part of the app that was never opened before may be missing.
          </p>
        </Notice>
        <Button look="primary" wide onClick={() => window.location.reload()}>
          Load again
        </Button>
        <a href="/" className="flex min-h-target items-center justify-center font-bold text-oil">
          Go to the Shed
        </a>
      </main>
    );
  }
}
