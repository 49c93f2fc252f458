import type { Route } from "next";
import Link from "next/link";
import type { ComponentProps, ReactNode } from "react";

export type ButtonKind = "primary" | "plain" | "refuse";

const SHAPE =
  "inline-flex min-h-9 items-center justify-center gap-2 rounded-edge border px-4 py-1.5 text-sm font-semibold no-underline disabled:border-rule-strong disabled:bg-transparent disabled:text-ink-2 print:hidden";

const KINDS: Record<ButtonKind, string> = {
  primary: "border-ink bg-ink text-sheet hover:bg-ink-2",
  plain: "border-ink bg-transparent text-ink hover:bg-band",
  refuse: "border-signal bg-transparent text-signal hover:bg-signal-pale",
};

interface ButtonProps extends ComponentProps<"button"> {
  kind?: ButtonKind;
  /** While the act runs: the button is off and says so. */
  busy?: boolean;
}

/** A button does something; an ellipsis in its text says that more is asked first. */
export function Button({ kind = "plain", busy = false, disabled, type = "button", className, ...rest }: ButtonProps) {
  return (
    <button
      type={type}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={[SHAPE, KINDS[kind], className].filter(Boolean).join(" ")}
      {...rest}
    />
  );
}

interface ButtonLinkProps {
  href: string;
  kind?: ButtonKind;
  children: ReactNode;
}

/** Looks like a button, goes to a page. */
export function ButtonLink({ href, kind = "plain", children }: ButtonLinkProps) {
  return (
    <Link href={href as Route} className={`${SHAPE} ${KINDS[kind]}`}>
      {children}
    </Link>
  );
}
