import type { ReactNode } from "react";
import { SectionHead } from "../../../components/text";

/** One part of the record, with an address of its own so that what is missing can lead there. */
export function Section({
  id,
  title,
  aside,
  children,
}: {
  id: string;
  title: string;
  aside?: ReactNode;
  children: ReactNode;
}) {
  return (
    <section id={id} aria-label={title} className="scroll-mt-3 pb-7">
      <SectionHead aside={aside}>{title}</SectionHead>
      <div className="pt-2">{children}</div>
    </section>
  );
}
