import type { Metadata } from "next";
import Link from "next/link";
import { Brand } from "@/components/ui/mark";
import { Button } from "@/components/ui/button";
import { EndSection, FamiliesSection, PathSection, SiteFooter } from "./sections";
import { Hero } from "./hero";
import { SafetySection, TicketsSection } from "./proof";

export const metadata: Metadata = {
  title: { absolute: "The ledger for small scrap outfits · Curbweight" },
  description: "Curbweight is the ledger for people who pick up dead appliances, take them apart and sell the metal by grade.",
};

/** The public front page. Every figure on it is invented, and the page says so. */
export default function HomePage() {
  return (
    <>
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <header className="top">
        <div className="wrap">
          <Brand href="/" />
          <nav aria-label="Site">
            <a className="quiet" href="#path">
              How it works
            </a>
            <a className="quiet" href="#tickets">
              Tickets
            </a>
            <a className="quiet" href="#safety">
              Safety
            </a>
            <Link href="/sign-in">Sign in</Link>
            <Button href="/sign-up">Start a ledger</Button>
          </nav>
        </div>
      </header>
      <main id="main" tabIndex={-1}>
        <Hero />
        <PathSection />
        <div className="two">
          <div className="wrap">
            <TicketsSection />
            <SafetySection />
          </div>
        </div>
        <FamiliesSection />
        <EndSection />
      </main>
      <SiteFooter />
    </>
  );
}
