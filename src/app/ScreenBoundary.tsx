import { Component, type ReactNode } from "react";
import { RouteError } from "./RouteError";

interface Props {
  /** where one is; going anywhere else lets go of the failure */
  place: string;
  onError?: () => void;
  children: ReactNode;
}

interface State {
  failed: { error: unknown } | null;
  place: string;
}

/** A screen that fails takes nothing else along. */
export class ScreenBoundary extends Component<Props, State> {
  override state: State = { failed: null, place: this.props.place };

  static getDerivedStateFromError(error: unknown): Partial<State> {
    return { failed: { error } };
  }

  static getDerivedStateFromProps({ place }: Props, state: State): State | null {
    return place === state.place ? null : { failed: null, place };
  }

  override componentDidCatch(): void {
    this.props.onError?.();
  }

  override render(): ReactNode {
    const { failed } = this.state;
    return failed ? <RouteError error={failed.error} /> : this.props.children;
  }
}
