import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { EarningsWaterfall, WhyItChanged } from "@/components/money/earnings-charts";
import { EarningsKey } from "@/components/money/earnings-key";
import { GradeTable } from "@/components/money/grade-table";
import { MoneyNav } from "@/components/money/money-nav";
import { MonthQuestion } from "@/components/money/month-question";
import { RunningCosts } from "@/components/money/running-costs";
import { currencySign } from "@/components/money/words";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { monthOf, shiftMonth } from "@/lib/clock";
import { formatMonth } from "@/lib/format";
import { averagePriceOf } from "@/lib/money/rules";
import { earningsQuery } from "@/lib/money/schema";
import { seeEarnings } from "@/lib/money/service";

type Params = Promise<{ outfit: string; month: string }>;

export async function generateMetadata({ params }: { params: Params }): Promise<Metadata> {
  const parsed = earningsQuery.safeParse({ month: (await params).month });
  return { title: parsed.success ? formatMonth(parsed.data.month) : "Money" };
}

/** The month's review: what was sold, what it cost, what was left, and why that changed. */
export default async function MonthPage({ params, searchParams }: { params: Params; searchParams: Promise<{ ask?: string | string[] }> }) {
  const { outfit: slug, month: text } = await params;
  const ctx = await pageContextFor(slug, "earnings.see");
  const parsed = earningsQuery.safeParse({ month: text });
  if (!parsed.success) notFound();
  const { month } = parsed.data;
  const earnings = await seeEarnings(ctx, { month });
  const { currency, exponent, weightUnit: unit } = ctx.outfit;
  const { role } = ctx.actor;
  const present = monthOf(ctx.today);
  const beside = (by: number) => {
    const other = shiftMonth(month, by);
    return (
      <Button variant="line" href={`/o/${slug}/money/${other}`}>
        {formatMonth(other)}
      </Button>
    );
  };
  const verb = earnings.closedAt === null ? "close" : "reopen";
  const mayAct = verb === "close" ? can(role, "months.close") && month < present : can(role, "months.reopen");
  const asking = mayAct && (await searchParams).ask === verb;
  const state = earnings.closedAt !== null ? "Closed." : month < present ? "Open." : month === present ? "Open, and not over yet." : "Not begun.";
  return (
    <div className="page aside">
      <PageHead
        title={formatMonth(month)}
        fact={state}
        actions={
          <>
            {beside(-1)}
            {month < present ? beside(1) : null}
            {mayAct && !asking ? (
              <Button variant={verb === "close" ? "filled" : "line"} href={`/o/${slug}/money/${month}?ask=${verb}`}>
                {verb === "close" ? "Close the month" : "Open the month again"}
              </Button>
            ) : null}
          </>
        }
      />
      {asking ? <MonthQuestion slug={slug} month={month} verb={verb} /> : null}
      <MoneyNav slug={slug} current="month" />
      <EarningsKey earnings={earnings} slug={slug} currency={currency} exponent={exponent} unit={unit} />
      <EarningsWaterfall earnings={earnings} currency={currency} unit={unit} />
      <WhyItChanged earnings={earnings} currency={currency} unit={unit} />
      <Panel title="Grades sold" sub={`change is against ${formatMonth(earnings.before.month)}`}>
        {earnings.byGrade.length === 0 ? (
          <EmptyState level={3} title="Nothing was sold in this month">
            A ticket counts in the month it is dated in, once it is posted.
          </EmptyState>
        ) : (
          <GradeTable
            slug={slug}
            month={month}
            grades={earnings.byGrade}
            unit={unit}
            currency={currency}
            sign={currencySign(currency)}
            averagePrice={averagePriceOf(earnings, exponent)}
          />
        )}
      </Panel>
      <RunningCosts slug={slug} earnings={earnings} currency={currency} />
    </div>
  );
}
