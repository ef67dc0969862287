import { Component, type ReactNode } from 'react';
import { Button } from '../components/ui/button.tsx';
import { Notice } from '../components/ui/states.tsx';

interface Props {
  /** A change of this brings the screen back, e.g. the address. */
  resetOn: string;
  children: ReactNode;
}
interface State {
  failed: boolean;
  resetOn: string;
}

/** Catches a screen that broke, so that the rest of the page goes on. */
export class ErrorBoundary extends Component<Props, State> {
  override state: State = { failed: false, resetOn: this.props.resetOn };

  static getDerivedStateFromError(): Partial<State> {
    return { failed: true };
  }

  static getDerivedStateFromProps(props: Props, state: State): Partial<State> | null {
    return props.resetOn === state.resetOn ? null : { failed: false, resetOn: props.resetOn };
  }

  override render() {
    if (!this.state.failed) return this.props.children;
    return (
      <div className="flex flex-col items-start gap-3 px-4 py-6 desk:px-6">
        <Notice tone="wrong" role="alert" title="This part of the page broke.">
          <p className="text-ink-2">
            What you entered is kept in the address where the page keeps it there. Loading it again usually helps.
          </p>
        </Notice>
        <Button onClick={() => window.location.reload()}>Load the page again</Button>
      </div>
    );
  }
}
