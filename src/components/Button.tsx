import type { ButtonHTMLAttributes, Ref } from "react";
import { Link, type LinkProps } from "react-router-dom";
import { classes } from "../lib/classes";

export type ButtonKind = "primary" | "plain" | "quiet" | "danger";

const base =
  "inline-flex items-center justify-center gap-2 rounded-sm text-sm font-bold whitespace-nowrap no-underline select-none disabled:opacity-50";
const looks: Record<ButtonKind, string> = {
  primary:
    "border border-verdigris bg-verdigris text-paper px-3 h-7 pointer-coarse:min-h-11 hover:enabled:bg-ink hover:enabled:border-ink",
  plain:
    "border border-ink bg-transparent text-ink px-3 h-7 pointer-coarse:min-h-11 hover:bg-tint disabled:hover:bg-transparent",
  quiet:
    "touch-word border-0 bg-transparent text-ink px-0 h-7 underline decoration-rule underline-offset-4 hover:decoration-ink",
  danger: "border border-signal bg-transparent text-signal px-3 h-7 pointer-coarse:min-h-11 hover:bg-sheet",
};

export const buttonClass = (kind: ButtonKind, extra?: string) => classes(base, looks[kind], extra);

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  /** one primary action a screen; plain for the rest; quiet inside a line of text */
  kind?: ButtonKind;
  ref?: Ref<HTMLButtonElement>;
}

export function Button({ kind = "plain", type = "button", className, ...rest }: ButtonProps) {
  return <button type={type} className={buttonClass(kind, className)} {...rest} />;
}

export function ButtonLink({ kind = "plain", className, ...rest }: LinkProps & { kind?: ButtonKind }) {
  return <Link className={buttonClass(kind, className)} {...rest} />;
}
