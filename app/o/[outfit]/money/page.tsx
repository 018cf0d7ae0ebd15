import { redirect } from "next/navigation";
import { pageContext } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { monthOf } from "@/lib/clock";

/** Money opens on the month for those who may see it, and on their own costs for the others. */
export default async function MoneyPage({ params }: { params: Promise<{ outfit: string }> }): Promise<never> {
  const { outfit: slug } = await params;
  const ctx = await pageContext(slug);
  redirect(can(ctx.actor.role, "earnings.see") ? `/o/${slug}/money/${monthOf(ctx.today)}` : `/o/${slug}/money/costs`);
}
