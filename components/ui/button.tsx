import Link from "next/link";
import type { ButtonHTMLAttributes, ReactNode } from "react";

export type ButtonKind = "main" | "plain" | "quiet";

const KINDS: Record<ButtonKind, string> = {
  main: "border-paint bg-paint text-paint-ink enabled:hover:brightness-90",
  plain: "border-strong bg-sheet text-strong hover:bg-tint",
  quiet: "border-transparent bg-transparent text-strong underline underline-offset-4 hover:bg-tint",
};

/** Looks of a press, for buttons and for links that look like one. At least 44 px high. */
export function buttonClass(kind: ButtonKind = "plain"): string {
  return `inline-flex min-h-11 items-center justify-center gap-2 rounded border-[1.5px] px-4 py-1.5 text-center font-plate text-[1.2rem] font-semibold leading-tight disabled:opacity-60 ${KINDS[kind]}`;
}

type ButtonProps = ButtonHTMLAttributes<HTMLButtonElement> & { kind?: ButtonKind };

export function Button({ kind = "plain", type = "button", className = "", ...rest }: ButtonProps) {
  return <button type={type} className={`${buttonClass(kind)} ${className}`} {...rest} />;
}

type LinkButtonProps = { href: string; kind?: ButtonKind; className?: string; children: ReactNode; download?: boolean };

export function LinkButton({ href, kind = "plain", className = "", children, download = false }: LinkButtonProps) {
  const look = `${buttonClass(kind)} ${className}`;
  // A download leaves the router alone.
  if (download) {
    return (
      <a href={href} className={look} download>
        {children}
      </a>
    );
  }
  return (
    <Link href={href} className={look}>
      {children}
    </Link>
  );
}
