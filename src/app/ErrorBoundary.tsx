import { Component, type ReactNode } from 'react';
import { saveFile } from './files';

/** The one place where a bug of the page is caught: the layout can still be saved. */
export default class ErrorBoundary extends Component<{ children: ReactNode }, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: Error): { error: Error } {
    return { error };
  }

  override render(): ReactNode {
    const { error } = this.state;
    if (error === null) return this.props.children;
    return (
      <div className="failed" role="alert">
        <h1>Something in the page broke.</h1>
        <p className="say">The layout is still here. Save it, then go on.</p>
        <p className="dimmed">{error.message}</p>
        <div className="notice-choices">
          <button type="button" className="act main" onClick={() => void saveFile(true)}>
            Save the layout
          </button>
          <button type="button" className="act" onClick={() => this.setState({ error: null })}>
            Go on
          </button>
        </div>
      </div>
    );
  }
}
