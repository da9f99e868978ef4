import { Component, type ComponentType, type ReactNode } from 'react';
import { ErrorState } from './states.tsx';

type Props = {
  children: ReactNode;
  /** Called before it tries again: forget what failed. */
  onReset?: () => void;
  /** What to stand the error in, where the page around it is gone too. */
  frame?: ComponentType<{ children: ReactNode }>;
};

/** Shows what was thrown below it and a way to try again. Give it a `key` (the address) so that leaving clears it. */
export class ErrorBoundary extends Component<Props, { error: unknown }> {
  override state: { error: unknown } = { error: null };

  static getDerivedStateFromError(error: unknown) {
    return { error };
  }

  override render() {
    if (this.state.error === null) return this.props.children;
    const shown = <ErrorState error={this.state.error} onRetry={this.onRetry} />;
    const { frame: Frame } = this.props;
    return Frame ? <Frame>{shown}</Frame> : shown;
  }

  private onRetry = () => {
    this.props.onReset?.();
    this.setState({ error: null });
  };
}
