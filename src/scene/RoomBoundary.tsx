import { Component, type ReactNode } from 'react';

interface RoomBoundaryProps {
  /** What is drawn instead once drawing has failed. */
  fallback: ReactNode;
  onFailure: (error: unknown) => void;
  children: ReactNode;
}

/** The last resort: whatever fails in the drawing, the room is never a blank box. */
export default class RoomBoundary extends Component<RoomBoundaryProps, { failed: boolean }> {
  override state = { failed: false };

  static getDerivedStateFromError() {
    return { failed: true };
  }

  override componentDidCatch(error: unknown) {
    this.props.onFailure(error);
  }

  override render() {
    return this.state.failed ? this.props.fallback : this.props.children;
  }
}
