import type { Metadata } from "next";
import type { ReactNode } from "react";
import { Providers } from "@/components/providers";
import { OutfitShell } from "@/components/shell/outfit-shell";
import { SignOutButton } from "@/components/today/sign-out-button";
import { stationsOf } from "@/components/today/stations";
import { pageContext } from "@/lib/auth/page";
import { lineOf, outfitsOfPerson } from "@/lib/today/pages";

export async function generateMetadata({ params }: { params: Promise<{ outfit: string }> }): Promise<Metadata> {
  const { outfit } = await pageContext((await params).outfit);
  return { title: { default: outfit.name, template: `%s · ${outfit.name} · Curbweight` } };
}

/** The frame of every page inside an outfit, with the line's live figures. */
export default async function OutfitLayout({ params, children }: { params: Promise<{ outfit: string }>; children: ReactNode }) {
  const { outfit: slug } = await params;
  const ctx = await pageContext(slug);
  const [figures, outfits] = await Promise.all([lineOf(ctx), outfitsOfPerson(ctx)]);
  const { oldestPriceDays, members } = figures;
  return (
    <Providers key={slug}>
      <OutfitShell
        outfit={{ slug, name: ctx.outfit.name, ...(ctx.outfit.place === null ? {} : { place: ctx.outfit.place }) }}
        person={{ name: ctx.actor.name }}
        outfits={outfits}
        stations={stationsOf(ctx.outfit, ctx.today, figures)}
        notes={{
          crew: String(members),
          ...(oldestPriceDays === null ? {} : { prices: oldestPriceDays === 1 ? "oldest 1 day" : `oldest ${oldestPriceDays} days` }),
        }}
        signOut={<SignOutButton />}
      >
        {children}
      </OutfitShell>
    </Providers>
  );
}
