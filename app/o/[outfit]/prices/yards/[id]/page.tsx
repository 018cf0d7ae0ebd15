import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { YardForm } from "@/components/prices/yard-form";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { findYard } from "@/lib/prices/pages";

export const metadata: Metadata = { title: "Yard" };

/** One yard: a form for those who may change it, a record for the others. */
export default async function YardPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "yards.see");
  const yard = await findYard(ctx, id);
  if (!yard) notFound();
  if (can(ctx.actor.role, "yards.change")) {
    return (
      <div className="page narrow-page">
        <YardForm slug={slug} kept={yard} />
      </div>
    );
  }
  const facts = [
    ["Place", yard.place],
    ["Phone", yard.phone],
    ["Hours", yard.hours],
    ["Note", yard.note],
  ] as const;
  return (
    <div className="page narrow-page">
      <PageHead title={yard.name} />
      <Panel padded>
        <dl className="grid gap-3 pt-3">
          {facts.map(([name, value]) => (
            <div key={name} className="tk-fact">
              <dt>{name}</dt>
              <dd>{value ?? "not said"}</dd>
            </div>
          ))}
        </dl>
      </Panel>
    </div>
  );
}
