import type { Metadata } from "next";
import { InvitePanel } from "@/components/people/invite-panel";
import { MemberList } from "@/components/people/member-list";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { seeInvitations } from "@/lib/people/invitations";
import { seeMembers } from "@/lib/people/service";

export const metadata: Metadata = { title: "Crew" };

/** Who belongs to the outfit, and the way in for others. */
export default async function CrewPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "members.see");
  const mayChange = can(ctx.actor.role, "members.change");
  const [{ items }, invitations] = await Promise.all([seeMembers(ctx), mayChange ? seeInvitations(ctx) : null]);
  return (
    <div className="narrow-page">
      <PageHead title="Crew" fact="Who works in this ledger, and as what." />
      <Panel title="Members" sub={String(items.length)}>
        <MemberList slug={slug} members={items} ownId={ctx.actor.memberId} mayChange={mayChange} />
      </Panel>
      {invitations ? <InvitePanel slug={slug} invitations={invitations.items} today={ctx.today} /> : null}
    </div>
  );
}
