import type { ReactNode } from "react";
import { Brand } from "./mark";

interface TopBarProps {
  /** Where the mark leads. */
  home: string;
  /** The outfit's name and place, or the switcher between outfits. */
  outfit: ReactNode;
  /** Prices, Crew, Settings and the person, for wide screens. */
  shop: ReactNode;
  /** The phone's menu, which reaches everything the foot does not. */
  menu: ReactNode;
}

/** The slim ink bar: mark, outfit, then Prices, Crew, Settings, person. */
export function TopBar({ home, outfit, shop, menu }: TopBarProps) {
  return (
    <header className="top">
      <Brand href={home} />
      <div className="outfit">{outfit}</div>
      {shop}
      {menu}
    </header>
  );
}
