import { formatMoney, formatWeight } from "@/lib/format";
import { sum } from "@/lib/arithmetic/decimal";
import type { PickupRecord } from "@/lib/pickups/schema";
import { PAID_FROM_NAME } from "./words";

/** The strip of figures over a pickup: what was estimated, what is left, what was weighed, what was paid. */
export function PickupFigures({ pickup, unit, currency }: { pickup: PickupRecord; unit: string; currency: string }) {
  const weighed = sum(pickup.weighIns.filter((weighIn) => weighIn.voidedAt === null).map((weighIn) => weighIn.net));
  const weight = (value: string) => (
    <>
      {formatWeight(value)}
      <span className="u">{unit}</span>
    </>
  );
  return (
    <dl className="key haul-figures">
      <div>
        <dt>Estimate</dt>
        <dd>
          <b className="n">{weight(pickup.estimatedWeight)}</b>
        </dd>
      </div>
      <div>
        <dt>Left on the pile</dt>
        <dd>
          <b className="n">{weight(pickup.remainingWeight)}</b>
        </dd>
      </div>
      <div>
        <dt>Weighed from it</dt>
        <dd>
          <b className="n">{weight(weighed)}</b>
        </dd>
      </div>
      {pickup.paidMinor === null ? null : (
        <div>
          <dt>Paid{pickup.paidMinor > 0 && pickup.paidFrom !== null ? `, from ${PAID_FROM_NAME[pickup.paidFrom].toLowerCase()}` : ""}</dt>
          <dd>
            <b className="n">{formatMoney(pickup.paidMinor, currency)}</b>
            {pickup.remainingCostMinor !== null && pickup.remainingCostMinor > 0 ? (
              <em className="n">{formatMoney(pickup.remainingCostMinor, currency)} still in the pile</em>
            ) : null}
          </dd>
        </div>
      )}
    </dl>
  );
}
