import { lazy, Suspense, type ComponentType } from "react";

/** A dialog whose code is fetched when it is first opened, and which starts afresh each time. */
export function whenOpened<Props extends { open: boolean }>(load: () => Promise<{ default: ComponentType<Props> }>) {
  const Late = lazy(load) as unknown as ComponentType<Props>;
  return function LateDialog(props: Props) {
    return props.open ? (
      <Suspense fallback={null}>
        <Late {...props} />
      </Suspense>
    ) : null;
  };
}
