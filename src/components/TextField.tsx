import { useId, type InputHTMLAttributes, type ReactNode, type Ref, type TextareaHTMLAttributes } from "react";
import { classes } from "../lib/classes";

interface Shared {
  label: string;
  hint?: ReactNode;
  error?: string | null | undefined;
}

// What may only be read is text, not a box that looks as if it could be typed in.
const box =
  "block w-full rounded-sm border bg-sheet px-2 text-base disabled:opacity-60 [&[readonly]]:resize-none [&[readonly]]:border-transparent [&[readonly]]:bg-transparent [&[readonly]]:px-0 [&[readonly]]:py-0 [&[readonly]]:h-auto";
const edge = (error: unknown) => (error ? "border-signal" : "border-muted");

function Frame({
  id,
  label,
  hint,
  error,
  children,
  className,
}: Shared & { id: string; children: ReactNode; className?: string | undefined }) {
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block text-sm">
        {label}
      </label>
      {children}
      {error && (
        <p id={`${id}-wrong`} role="alert" className="pt-0.5 text-sm text-signal">
          {error}
        </p>
      )}
      {hint !== undefined && (
        <div id={`${id}-hint`} className="pt-0.5 text-sm text-muted">
          {hint}
        </div>
      )}
    </div>
  );
}

const describe = (id: string, error: unknown, hint: unknown) =>
  [error && `${id}-wrong`, hint !== undefined && `${id}-hint`].filter(Boolean).join(" ") || undefined;

/** A line of text in a form. Spread react-hook-form's `register(...)` into it. */
export function TextField({
  label,
  hint,
  error,
  className,
  ...input
}: Shared & InputHTMLAttributes<HTMLInputElement> & { ref?: Ref<HTMLInputElement> }) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, error, className }}>
      <input
        id={id}
        className={classes(box, "h-8", edge(error))}
        aria-invalid={Boolean(error)}
        aria-describedby={describe(id, error, hint)}
        {...input}
      />
    </Frame>
  );
}

/** Several lines of text in a form. */
export function TextArea({
  label,
  hint,
  error,
  className,
  ...input
}: Shared & TextareaHTMLAttributes<HTMLTextAreaElement> & { ref?: Ref<HTMLTextAreaElement> }) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, error, className }}>
      <textarea
        id={id}
        rows={3}
        className={classes(box, "py-1", edge(error))}
        aria-invalid={Boolean(error)}
        aria-describedby={describe(id, error, hint)}
        {...input}
      />
    </Frame>
  );
}
