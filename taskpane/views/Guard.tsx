import { Component, type ComponentChildren } from 'preact';
import { Problem } from '../../core/problem.ts';
import { panelWords } from '../../core/words/panelWords.ts';

interface Guarded {
  readonly children: ComponentChildren;
  /** What the children are drawn from: when it changes, they are tried again. */
  readonly of: unknown;
}

/** Keeps what cannot be drawn from taking the rest of the panel with it, and says why in its place. */
export class Guard extends Component<Guarded, { readonly error: unknown; readonly of: unknown }> {
  override state = { error: undefined, of: undefined };

  override componentDidCatch(error: unknown): void {
    if (!(error instanceof Problem)) console.error(error);
    this.setState({ error, of: this.props.of });
  }

  override render() {
    const { error, of } = this.state as { error: unknown; of: unknown };
    if (error === undefined || of !== this.props.of) return this.props.children;
    const detail = error instanceof Error ? error.message : String(error);
    return <p class="wrong">{error instanceof Problem ? detail : panelWords.fault(detail)}</p>;
  }
}
