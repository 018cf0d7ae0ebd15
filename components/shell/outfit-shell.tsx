import Link from "next/link";
import type { ReactNode } from "react";
import { TopBar } from "@/components/ui/top-bar";
import type { Station, StationKey } from "@/components/ui/stations";
import { Disclosure } from "./disclosure";
import { CurrentFoot, CurrentLine, PhoneMenu, ShopNav, type ShopLink } from "./navigation";

interface OutfitShellProps {
  outfit: { name: string; place?: string; slug: string };
  person: { name: string };
  /** Every outfit the person belongs to, this one too. */
  outfits: { slug: string; name: string }[];
  /** The eight stations in order, with their figures as this person may see them. */
  stations: Station[];
  /** Overrides the station the address says; `null` for none. */
  current?: StationKey | null;
  /** Quiet facts after Prices and Crew in the top bar. */
  notes?: { prices?: string; crew?: string };
  /** The button or link that signs the person out. */
  signOut: ReactNode;
  children: ReactNode;
}

function shopLinks(slug: string, notes: OutfitShellProps["notes"]): ShopLink[] {
  const base = `/o/${slug}`;
  return [
    { key: "prices", name: "Prices", href: `${base}/prices`, note: notes?.prices },
    { key: "crew", name: "Crew", href: `${base}/crew`, note: notes?.crew },
    { key: "settings", name: "Settings", href: `${base}/settings` },
  ];
}

/** The frame of every page inside an outfit: skip link, top bar, line, the page, and the foot on a phone. */
export function OutfitShell(props: OutfitShellProps) {
  const { outfit, person, outfits, stations, current, notes, signOut, children } = props;
  const links = shopLinks(outfit.slug, notes);
  const others = outfits.filter((other) => other.slug !== outfit.slug);
  const where = outfit.place ? `${outfit.name}, ${outfit.place}` : outfit.name;
  const switches = others.map((other) => (
    <Link key={other.slug} href={`/o/${other.slug}`}>
      {other.name}
    </Link>
  ));
  return (
    <div className="shell">
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <TopBar
        home={`/o/${outfit.slug}`}
        outfit={
          others.length > 0 ? (
            <Disclosure className="outfits" summary={where}>
              <p>Your other outfits</p>
              {switches}
            </Disclosure>
          ) : (
            where
          )
        }
        shop={<ShopNav links={links} person={person.name} personMenu={signOut} />}
        menu={
          <PhoneMenu
            outfit={where}
            stations={stations}
            links={links}
            personMenu={
              <>
                {switches}
                <p>{person.name}</p>
                {signOut}
              </>
            }
          />
        }
      />
      <CurrentLine stations={stations} current={current} />
      <main id="main" tabIndex={-1}>
        {children}
      </main>
      <CurrentFoot stations={stations} current={current} />
    </div>
  );
}
