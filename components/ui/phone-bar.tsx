import Link from "next/link";
import type { ReactNode } from "react";
import { Icon } from "./icons";

interface PhoneBarProps {
  /** The way back, and where it leads in words: "Back to pickups". */
  back: { href: string; label: string };
  title: ReactNode;
  /** One fact at the right: the time, the scale in use. */
  fact?: ReactNode;
}

/** The dark bar of a field screen. At the desk it is the page's head. Stands first in a `.phone`. */
export function PhoneBar({ back, title, fact }: PhoneBarProps) {
  return (
    <div className="bar">
      <Link className="back" href={back.href} aria-label={back.label}>
        <Icon name="back" />
      </Link>
      <h1>{title}</h1>
      {fact ? <span className="fact n">{fact}</span> : null}
    </div>
  );
}
