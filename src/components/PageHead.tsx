import type { ReactNode } from "react";

/** The line that names a screen, with what concerns the whole of it: what it holds at the left, what may be done at the right. */
export function PageHead({
  up,
  title,
  about,
  children,
}: {
  /** the way up, to the list or record it belongs to */
  up?: ReactNode;
  title: ReactNode;
  about?: ReactNode;
  /** what may be done, the primary action last */
  children?: ReactNode;
}) {
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule px-5 py-2">
      {up}
      <h1 className="text-lg">{title}</h1>
      {about}
      <span className="flex-1" />
      {children}
    </div>
  );
}
