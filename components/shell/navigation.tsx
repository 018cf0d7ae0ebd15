"use client";

import Link from "next/link";
import type { ReactNode } from "react";
import { Foot } from "@/components/ui/foot";
import { Line } from "@/components/ui/line";
import type { Station, StationKey } from "@/components/ui/stations";
import { Disclosure } from "./disclosure";
import { useCurrentStation, type ShopKey } from "./use-current-station";

interface StationsProps {
  stations: Station[];
  /** Overrides the station the address says. */
  current?: StationKey | null;
}

/** One link of the top bar. */
export interface ShopLink {
  key: ShopKey;
  name: string;
  href: string;
  /** A quiet fact after the name: "oldest 9 days". */
  note?: string;
}

/** The line with the station of the address hung from the beam. */
export function CurrentLine({ stations, current }: StationsProps) {
  const { station } = useCurrentStation();
  return <Line stations={stations} current={current === undefined ? station : current} />;
}

/** The foot with the station of the address set in the inverted block. */
export function CurrentFoot({ stations, current }: StationsProps) {
  const { station } = useCurrentStation();
  return <Foot stations={stations} current={current === undefined ? station : current} />;
}

/** Prices, Crew and Settings at the right of the top bar, then the person's own menu. */
export function ShopNav({ links, person, personMenu }: { links: ShopLink[]; person: string; personMenu: ReactNode }) {
  const { shop } = useCurrentStation();
  return (
    <nav className="shop" aria-label="Shop">
      {links.map((link) => (
        <Link key={link.key} href={link.href} aria-current={link.key === shop ? "page" : undefined}>
          {link.name} {link.note ? <small>{link.note}</small> : null}
        </Link>
      ))}
      <Disclosure className="person" summary={person}>
        {personMenu}
      </Disclosure>
    </nav>
  );
}

interface PhoneMenuProps {
  outfit: string;
  stations: Station[];
  links: ShopLink[];
  personMenu: ReactNode;
}

/** The phone's menu: Today, Requests and Money, which the foot has no room for, then the shop and the person. */
export function PhoneMenu({ outfit, stations, links, personMenu }: PhoneMenuProps) {
  const { station, shop } = useCurrentStation();
  const rest = stations.filter((one) => ["today", "requests", "money"].includes(one.key));
  return (
    <Disclosure className="menu" summary="Menu">
      <nav aria-label="Everything else">
        <p>{outfit}</p>
        {rest.map((one) => (
          <Link key={one.key} href={one.href} aria-current={one.key === station ? "page" : undefined}>
            {one.name}
            <span className="n">
              {one.figure} {one.unit ? <span className="u">{one.unit}</span> : null}
            </span>
          </Link>
        ))}
        {links.map((link) => (
          <Link key={link.key} href={link.href} aria-current={link.key === shop ? "page" : undefined}>
            {link.name}
            {link.note ? <small>{link.note}</small> : null}
          </Link>
        ))}
        {personMenu}
      </nav>
    </Disclosure>
  );
}
