import { useRef, type ReactNode } from "react";
import { glossary, type GlossaryWord } from "../lib/glossary";
import { lateFailure, useLate } from "./useLate";

const loadSheet = () => import("./PopoverSheet");

/** Help at the point of use: the word itself opens it, marked by a dotted line. */
export function Help({ title, children, trigger }: { title: string; children: ReactNode; trigger?: ReactNode }) {
  const button = useRef<HTMLButtonElement>(null);
  const { Part: Sheet, failed, open, close, near } = useLate(loadSheet);
  return (
    <>
      <button
        ref={button}
        type="button"
        aria-haspopup="dialog"
        aria-expanded={Sheet !== null}
        className="cursor-help rounded-sm text-left underline decoration-muted decoration-dotted underline-offset-3 hover:decoration-ink"
        aria-label={`${title}: what is this?`}
        title={failed ? lateFailure : undefined}
        onClick={Sheet ? close : open}
        {...near}
      >
        {trigger ?? title}
      </button>
      {Sheet && (
        <Sheet anchor={button} onClose={close} className="max-w-[340px] px-4 py-3">
          <p className="mb-1 font-mono text-sm font-bold">{title}</p>
          <div className="space-y-2 text-sm">{children}</div>
        </Sheet>
      )}
    </>
  );
}

/** A word of the product with its meaning behind it: <Term word="margin" />. */
export function Term({ word, children }: { word: GlossaryWord; children?: ReactNode }) {
  const { title, text } = glossary[word];
  return (
    <Help title={title} trigger={children ?? title.toLowerCase()}>
      {text.map((paragraph) => (
        <p key={paragraph}>{paragraph}</p>
      ))}
    </Help>
  );
}
