import { useRef, type ComponentType, type ReactNode } from "react";
import { glossaryTitles, type GlossaryWord } from "../lib/glossaryTitles";
import type { PopoverSheetProps } from "./PopoverSheet";
import { lateFailure, useLate } from "./useLate";

type SheetProps = PopoverSheetProps & { title: string; word?: GlossaryWord };
const loadSheet = (): Promise<{ default: ComponentType<SheetProps> }> => import("./HelpSheet");

/** Help at the point of use: the word itself opens it, marked by a dotted line. */
export function Help(props: { title: string; children: ReactNode; trigger?: ReactNode }) {
  return <HelpButton {...props} />;
}

/** A word of the product with its meaning behind it: <Term word="margin" />. */
export function Term({ word, children }: { word: GlossaryWord; children?: ReactNode }) {
  const title = glossaryTitles[word];
  return <HelpButton title={title} trigger={children ?? title.toLowerCase()} word={word} />;
}

interface HelpButtonProps {
  title: string;
  trigger?: ReactNode;
  /** its meaning comes with the sheet */
  word?: GlossaryWord;
  children?: ReactNode;
}

function HelpButton({ title, trigger, word, children }: HelpButtonProps) {
  const button = useRef<HTMLButtonElement>(null);
  const { Part: Sheet, failed, open, close, near } = useLate(loadSheet);
  return (
    <>
      <button
        ref={button}
        type="button"
        aria-haspopup="dialog"
        aria-expanded={Sheet !== null}
        className="touch-word cursor-help rounded-sm text-left underline decoration-muted decoration-dotted underline-offset-3 hover:decoration-ink"
        aria-label={`${title}: what is this?`}
        title={failed ? lateFailure : undefined}
        onClick={Sheet ? close : open}
        {...near}
      >
        {trigger ?? title}
      </button>
      {Sheet && (
        <Sheet
          anchor={button}
          onClose={close}
          label={title}
          className="max-w-[340px] px-4 py-3"
          title={title}
          {...(word === undefined ? {} : { word })}
        >
          {children}
        </Sheet>
      )}
    </>
  );
}
