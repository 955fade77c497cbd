import { Popover } from "radix-ui";
import type { ReactNode } from "react";
import { glossary, type GlossaryWord } from "../lib/glossary";

/** Help at the point of use: the word itself opens it, marked by a dotted line. */
export function Help({ title, children, trigger }: { title: string; children: ReactNode; trigger?: ReactNode }) {
  return (
    <Popover.Root>
      <Popover.Trigger
        className="cursor-help rounded-sm text-left underline decoration-muted decoration-dotted underline-offset-3 hover:decoration-ink"
        aria-label={`${title}: what is this?`}
      >
        {trigger ?? title}
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          sideOffset={6}
          collisionPadding={12}
          className="z-50 max-w-[340px] border border-ink bg-paper px-4 py-3 text-base text-ink"
        >
          <p className="mb-1 font-mono text-sm font-bold">{title}</p>
          <div className="space-y-2 text-sm">{children}</div>
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
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
