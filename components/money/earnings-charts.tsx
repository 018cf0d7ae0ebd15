import { DivergingBars } from "@/components/ui/charts/diverging-bars";
import { WaterfallBars } from "@/components/ui/charts/bars";
import { EmptyState } from "@/components/ui/empty-state";
import { Panel } from "@/components/ui/panel";
import { compare, subtract } from "@/lib/arithmetic/decimal";
import { formatMoney, formatMonth, formatWeightUnit } from "@/lib/format";
import { netEffects } from "@/lib/money/rules";
import type { Earnings } from "@/lib/money/schema";

type Props = { earnings: Earnings; currency: string; unit: string };

/** What stands between sales and net, costs positive; what came to nothing is left out, but for the two that always matter. */
function stepsOf(earnings: Earnings, currency: string) {
  const kinds = earnings.costsByKind
    .slice(0, 3)
    .map((cost) => cost.name.toLowerCase())
    .join(", ");
  const steps = [
    { label: "Cost of scrap", sub: "paid for what was sold", value: earnings.costOfScrapMinor, always: true },
    { label: "Running costs", sub: kinds, value: earnings.costsMinor, always: true },
    { label: "Haul-away fees", sub: "earned", value: 0 - earnings.haulAwayFeesMinor, always: false },
    { label: "Stock loss", sub: "counts and write-offs", value: earnings.stockLossMinor, always: false },
    { label: "Rounding", sub: "", value: earnings.roundingMinor, always: false },
  ];
  return steps
    .filter((step) => step.always || step.value !== 0)
    .map(({ label, sub, value }) => ({ label, ...(sub === "" ? {} : { sub }), value, valueLabel: formatMoney(0 - value, currency, { sign: value < 0 }) }));
}

/** From sales, stacked by family, down to what was left. */
export function EarningsWaterfall({ earnings, currency, unit }: Props) {
  const { salesMinor, netMinor, byGrade } = earnings;
  if (salesMinor === 0 && netMinor === 0)
    return (
      <Panel title="From sales to net">
        <EmptyState level={3} title="Nothing is booked in this month">
          Post a sale ticket or add a cost, and it stands here at once.
        </EmptyState>
      </Panel>
    );
  const steps = stepsOf(earnings, currency);
  const inWords = steps.map((step) => `${step.label} ${step.valueLabel}`).join(", ");
  return (
    <Panel title="From sales to net" sub="sales drawn by metal family" padded>
      <WaterfallBars
        sales={{
          label: "Sales",
          sub: formatWeightUnit(earnings.quantity, unit),
          value: salesMinor,
          valueLabel: formatMoney(salesMinor, currency),
          parts: byGrade.map((grade) => ({ family: grade.family, value: grade.salesMinor })),
        }}
        steps={steps}
        net={{ label: "Net", value: netMinor, valueLabel: formatMoney(netMinor, currency) }}
        summary={`Sales ${formatMoney(salesMinor, currency)}, ${inWords}, net ${formatMoney(netMinor, currency)}.`}
      />
    </Panel>
  );
}

/** The grade that moved sales most beside the price: what the mix is about. */
function volumeWords({ quantity, before }: Earnings, unit: string): string {
  const change = subtract(quantity, before.quantity);
  const order = compare(change, "0");
  if (order === 0) return "as much as before";
  return order > 0 ? `${formatWeightUnit(change, unit)} more sold` : `${formatWeightUnit(subtract(before.quantity, quantity), unit)} less sold`;
}

/** What moved the net against the month before, in one scale. */
export function WhyItChanged({ earnings, currency, unit }: Props) {
  const { why, before, netMinor, month } = earnings;
  const { scrapMinor, runningMinor, otherMinor } = netEffects(earnings);
  const [now, earlier] = [month, before.month].map((one) => formatMonth(one).split(" ")[0] ?? "");
  const effect = (label: string, sub: string, value: number) => ({ label, sub, value, valueLabel: formatMoney(value, currency, { sign: true }) });
  const moved = (value: number, more: string, less: string) => (value === 0 ? "no change" : value > 0 ? more : less);
  return (
    <Panel title={`Why it changed since ${earlier}`}>
      <DivergingBars
        before={{ label: `${earlier} net`, valueLabel: formatMoney(before.netMinor, currency) }}
        effects={[
          effect("Price", moved(why.priceMinor, "yards paid more per grade", "yards paid less per grade"), why.priceMinor),
          effect("Volume", volumeWords(earnings, unit), why.volumeMinor),
          effect("Mix", moved(why.mixMinor, "more of the dear grades", "more of the cheap grades"), why.mixMinor),
          effect("Cost of scrap", moved(scrapMinor, "what was sold cost less", "what was sold cost more"), scrapMinor),
          effect("Running costs", moved(runningMinor, "less spent", "more spent"), runningMinor),
          ...(otherMinor === 0 ? [] : [effect("Other", "fees, stock loss, rounding", otherMinor)]),
        ]}
        after={{ label: `${now} net`, valueLabel: formatMoney(netMinor, currency) }}
      />
    </Panel>
  );
}
