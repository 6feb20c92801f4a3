import { Component, type ErrorInfo, type ReactNode } from 'react';

interface Props {
  /** Name of the region in the sentence: "The tape", "The drawing". */
  readonly name: string;
  /** When one of these changes the region is tried again. */
  readonly resetOn?: readonly unknown[];
  readonly children: ReactNode;
}
interface State {
  readonly error: Error | null;
}

/** Keeps one region's fault inside it: the rest of the bench stays alive and the circuit is untouched. */
export class ErrorRegion extends Component<Props, State> {
  override state: State = { error: null };

  static getDerivedStateFromError(error: Error): State {
    return { error };
  }

  override componentDidCatch(error: Error, info: ErrorInfo) {
    console.error(`${this.props.name}:`, error, info.componentStack);
  }

  override componentDidUpdate(previous: Props) {
    const before = previous.resetOn ?? [];
    const now = this.props.resetOn ?? [];
    if (this.state.error && now.some((value, index) => value !== before[index])) this.setState({ error: null });
  }

  override render() {
    if (!this.state.error) return this.props.children;
    return (
      <div className="region-error" role="alert">
        <p>
          <strong>{this.props.name} could not be shown.</strong> The circuit is untouched and kept on this device.
        </p>
        <p className="text-13 text-ink2">{this.state.error.message}</p>
        <button type="button" className="button" onClick={() => this.setState({ error: null })}>
          Show it again
        </button>
      </div>
    );
  }
}
