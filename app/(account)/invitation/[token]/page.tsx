import type { Metadata } from "next";
import { JoinForm } from "@/components/people/join-form";
import { pagePerson } from "@/lib/auth/page";
import { now } from "@/lib/clock";
import { seeInvitation } from "@/lib/people/invitations";

export const metadata: Metadata = { title: "Join an outfit", robots: { index: false }, referrer: "no-referrer" };

/** What an invitation link opens. */
export default async function InvitationPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const [invitation, person] = await Promise.all([seeInvitation(token, now()), pagePerson()]);
  if (!invitation) {
    return (
      <div className="account-form">
        <h1>This link does not work any more</h1>
        <p>It was used, taken back, or is older than seven days. Ask the owner for a new one.</p>
      </div>
    );
  }
  return (
    <JoinForm
      token={token}
      outfitName={invitation.outfitName}
      role={invitation.role}
      inviter={invitation.inviter}
      person={person ? { name: person.name } : null}
    />
  );
}
