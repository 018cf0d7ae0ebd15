import type { ReactNode } from "react";
import { classes } from "./classes";

const drawings = {
  back: <path d="M12.5 4 6.5 10l6 6" />,
  check: <path d="M3.5 10.5 8 15l8.5-10" />,
  scale: <path d="M3 4.5h14M5 4.5v3h10v-3M4 16.5h12l-1.6-9H5.6zM10 14.2V11M7.6 14.2h4.8" />,
  hook: <path d="M10 1.8v4M7.2 5.8h5.6v2.4H7.2zM10 8.2v2.3c4.4 0 5.2 7.5-.2 7.5-2.6 0-4.3-1.8-4.3-4" />,
  tag: (
    <>
      <path d="M7 3.5h10.5v13H2.5V8zM11 3.5v13" />
      <path d="M5.9 10h1.4" />
    </>
  ),
  truck: (
    <>
      <path d="M1.8 4.5h10v9.5h-10zM11.8 8h3.6l2.8 3v3h-6.4" />
      <path d="M4 14h3v2.8H4zM13.2 14h3v2.8h-3z" fill="currentColor" />
    </>
  ),
  vise: <path d="M2 5.5h6v5H5.5v3M12 5.5h5.5v8H2.5v3h13v-3M8 7.5h4M1 17h17" />,
  magnet: <path d="M3.5 3v7.2a6.5 6.5 0 0 0 13 0V3h-4.3v7.2a2.2 2.2 0 0 1-4.4 0V3zM3.5 6.4h4.3M12.2 6.4h4.3" />,
  sheet: <path d="M4.5 2.5h8l3 3v12h-11zM7.5 8h5M7.5 11h5M7.5 14h3" />,
  photo: (
    <>
      <path d="M2.5 5.5h4l1.5-2h4l1.5 2h4v11h-15z" />
      <circle cx="10" cy="10.7" r="3.1" />
    </>
  ),
  pin: <path d="M10 18V11M5.5 2.5h9v8.5h-9zM8 6.7h4" />,
  note: <path d="M3.5 16.5v-3.3L13.2 3.5l3.3 3.3-9.7 9.7z" />,
  "no-signal": (
    <>
      <path d="M3.5 16.5v-3M8 16.5v-6M12.5 16.5V8M17 16.5V4" strokeWidth="2.4" strokeLinecap="butt" />
      <path d="M1.5 3.5 17 18.5" stroke="var(--sunk)" strokeWidth="5" />
      <path d="M2 4 17.5 19" strokeWidth="1.8" />
    </>
  ),
} satisfies Record<string, ReactNode>;

export type IconName = keyof typeof drawings;

/** A 20 px drawing in 1.6 px square-ended lines. Words always stand beside it or name the control it is in. */
export function Icon({ name, className }: { name: IconName; className?: string }) {
  return (
    <svg className={classes("ico", className)} viewBox="0 0 20 20" aria-hidden="true">
      {drawings[name]}
    </svg>
  );
}
