import type { ReactNode } from "react";
import "./site.css";

/** The public pages share one stylesheet, which no page inside an outfit loads. */
export default function SiteLayout({ children }: { children: ReactNode }) {
  return <div className="site">{children}</div>;
}
