import type { Metadata } from "next";
import Link from "next/link";
import { ApiKeyPanel } from "@/components/people/api-key-panel";
import { SettingsForm } from "@/components/people/settings-form";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { seeApiKeys } from "@/lib/people/api-keys";
import { seeSettings } from "@/lib/people/service";

export const metadata: Metadata = { title: "Settings" };

/** The outfit's settings and keys for the owner; the facts and the way to the own account for everybody. */
export default async function SettingsPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "outfit.see");
  const { role } = ctx.actor;
  const [settings, keys] = await Promise.all([seeSettings(ctx), can(role, "api-keys.change") ? seeApiKeys(ctx) : null]);
  const facts = [
    ["Currency", settings.currency],
    ["Weight unit", settings.weightUnit],
    ["Time zone", settings.timeZone.replaceAll("_", " ")],
    ["Country", settings.country],
  ];
  return (
    <div className="page narrow-page">
      <PageHead title="Settings" />
      <Panel title="Fixed for this outfit" sub={settings.fixed ? "the books hold figures in them" : "until anything is booked"} padded>
        <dl className="grid grid-cols-2 gap-3">
          {facts.map(([name, value]) => (
            <div key={name} className="tk-fact">
              <dt>{name}</dt>
              <dd>{value}</dd>
            </div>
          ))}
        </dl>
      </Panel>
      {can(role, "outfit.change") ? <SettingsForm slug={slug} settings={settings} /> : null}
      {keys ? <ApiKeyPanel slug={slug} keys={keys.items} /> : null}
      <Panel title="Your own account" padded>
        <p>
          <Link className="link" href="/account">
            Change your password, or sign out everywhere
          </Link>
        </p>
        <p className="pt-3">
          <Link className="link" href="/docs/api">
            Read how scripts use the API
          </Link>
        </p>
      </Panel>
    </div>
  );
}
