import Link from "next/link";
import type { ButtonHTMLAttributes, ReactNode } from "react";
import { classes, without } from "./classes";

interface Look {
  /** One filled button per area; lines for the rest; `danger` for what takes something away. */
  variant?: "filled" | "line" | "danger";
  size?: "sm" | "md" | "lg";
  className?: string;
  children: ReactNode;
}

type ButtonProps = Look & ({ href: string; type?: undefined } | (ButtonHTMLAttributes<HTMLButtonElement> & { href?: undefined }));

function lookOf({ variant = "filled", size = "md", className }: Look): string {
  return classes("btn", variant !== "filled" && "line-b", variant === "danger" && "danger", size !== "md" && size, className);
}

/** A button, or a link that looks like one when it has an `href`. */
export function Button(props: ButtonProps) {
  const look = lookOf(props);
  if (props.href !== undefined)
    return (
      <Link className={look} href={props.href}>
        {props.children}
      </Link>
    );
  return (
    <button type="button" {...without(props, "variant", "size", "className", "href")} className={look}>
      {props.children}
    </button>
  );
}

interface BigButtonProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, "children"> {
  /** What a press does: "Put in bin". */
  verb: string;
  /** What will be so afterwards: "C2-2 will hold 108.8 lb". */
  consequence?: ReactNode;
  /** Set while the press is being answered. The button stays pressable; the form guards against two. */
  busy?: boolean;
}

/** The one main action of a field screen: verb left, consequence right. Submits its form. */
export function BigButton({ verb, consequence, busy, className, ...rest }: BigButtonProps) {
  return (
    <button type="submit" {...rest} className={classes("btn big", className)} aria-busy={busy || undefined}>
      {verb}
      {consequence ? <small className="n">{consequence}</small> : null}
    </button>
  );
}
