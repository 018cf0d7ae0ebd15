import "server-only";
import { sql, type SQL } from "drizzle-orm";
import type { Reader } from "@/db/client";

/** One rule of the always-true list: whether it holds for an outfit, and what is off where it does not. */
export type RuleResult = { rule: string; holds: boolean; detail: string };

/** Each query answers with one row a breach (`what`, `off`); no row means the rule holds. At most five are read. */
const RULES: { rule: string; breaches: (outfitId: string) => SQL }[] = [
  {
    rule: "Every entry's postings sum to zero",
    breaches: (o) =>
      sql`select entry_id as what, sum(amount_minor) as off from postings where outfit_id = ${o} group by entry_id having sum(amount_minor) <> 0 limit 5`,
  },
  {
    rule: "Every movement's lines sum to zero",
    breaches: (o) =>
      sql`select movement_id as what, sum(quantity) as off from movement_lines where outfit_id = ${o} group by movement_id having sum(quantity) <> 0 limit 5`,
  },
  {
    rule: "Every entry and movement has lines, dated like itself",
    breaches: (o) => sql`
      select e.id as what, count(p.line) as off from entries e left join postings p on p.outfit_id = e.outfit_id and p.entry_id = e.id and p.occurred_on = e.occurred_on
      where e.outfit_id = ${o} group by e.id having count(p.line) < 2 or count(p.line) <> (select count(*) from postings q where q.outfit_id = ${o} and q.entry_id = e.id)
      union all
      select m.id, count(l.line) from movements m left join movement_lines l on l.outfit_id = m.outfit_id and l.movement_id = m.id and l.occurred_on = m.occurred_on
      where m.outfit_id = ${o} group by m.id having count(l.line) < 2 or count(l.line) <> (select count(*) from movement_lines q where q.outfit_id = ${o} and q.movement_id = m.id) limit 5`,
  },
  {
    rule: "Every account balance equals the sum of its postings",
    breaches: (o) => sql`
      select a.code as what, coalesce(b.balance_minor, 0) - coalesce(s.total, 0) as off from accounts a
      left join account_balances b on b.outfit_id = a.outfit_id and b.account = a.code
      left join (select account, sum(amount_minor) as total from postings where outfit_id = ${o} group by account) s on s.account = a.code
      where a.outfit_id = ${o} and coalesce(b.balance_minor, 0) <> coalesce(s.total, 0) limit 5`,
  },
  {
    rule: "Every monthly total equals the sum of its postings",
    breaches: (o) => sql`
      select what, sum(amount) as off from (
        select concat(month, ' ', account) as what, amount_minor as amount from account_months where outfit_id = ${o}
        union all
        select concat(date_format(occurred_on, '%Y-%m'), ' ', account), -sum(amount_minor) from postings where outfit_id = ${o} group by date_format(occurred_on, '%Y-%m'), account
      ) t group by what having sum(amount) <> 0 limit 5`,
  },
  {
    rule: "Every bin's balance equals the sum of its lines",
    breaches: (o) => sql`
      select b.label as what, coalesce(bb.quantity, 0) - coalesce(s.total, 0) as off from bins b
      left join bin_balances bb on bb.outfit_id = b.outfit_id and bb.bin_id = b.id
      left join (select bin_id, sum(quantity) as total from movement_lines where outfit_id = ${o} and bin_id is not null group by bin_id) s on s.bin_id = b.id
      where b.outfit_id = ${o} and coalesce(bb.quantity, 0) <> coalesce(s.total, 0) limit 5`,
  },
  {
    rule: "What is held of every grade, and its cost, equal the sums of their lines",
    breaches: (o) => sql`
      select g.name as what, concat(coalesce(gs.quantity, 0) - coalesce(q.total, 0), ' / ', coalesce(gs.cost_minor, 0) - coalesce(c.total, 0)) as off from grades g
      left join grade_stock gs on gs.outfit_id = g.outfit_id and gs.grade_id = g.id
      left join (select grade_id, sum(quantity) as total from movement_lines where outfit_id = ${o} and place in ('bin', 'load') group by grade_id) q on q.grade_id = g.id
      left join (select grade_id, sum(amount_minor) as total from postings where outfit_id = ${o} and account = 'scrap-stock' and grade_id is not null group by grade_id) c on c.grade_id = g.id
      where g.outfit_id = ${o} and (coalesce(gs.quantity, 0) <> coalesce(q.total, 0) or coalesce(gs.cost_minor, 0) <> coalesce(c.total, 0)) limit 5`,
  },
  {
    rule: "What is left of every pickup, and its cost, equal the sums of their lines",
    breaches: (o) => sql`
      select p.number as what, concat(coalesce(l.remaining_weight, 0) - coalesce(q.total, 0), ' / ', coalesce(l.remaining_cost_minor, 0) - coalesce(c.total, 0)) as off from pickups p
      left join lots l on l.outfit_id = p.outfit_id and l.pickup_id = p.id
      left join (select pickup_id, sum(quantity) as total from movement_lines where outfit_id = ${o} and place = 'pile' group by pickup_id) q on q.pickup_id = p.id
      left join (select pickup_id, sum(amount_minor) as total from postings where outfit_id = ${o} and account = 'scrap-stock' and grade_id is null group by pickup_id) c on c.pickup_id = p.id
      where p.outfit_id = ${o} and (coalesce(l.remaining_weight, 0) <> coalesce(q.total, 0) or coalesce(l.remaining_cost_minor, 0) <> coalesce(c.total, 0)) limit 5`,
  },
  {
    rule: "Scrap stock equals the cost of all grades and of what is left of the pickups",
    breaches: (o) => sql`
      select 'scrap-stock' as what, off from (select
        coalesce((select balance_minor from account_balances where outfit_id = ${o} and account = 'scrap-stock'), 0)
        - coalesce((select sum(cost_minor) from grade_stock where outfit_id = ${o}), 0)
        - coalesce((select sum(remaining_cost_minor) from lots where outfit_id = ${o}), 0) as off) t where off <> 0`,
  },
  {
    rule: "No bin is below zero",
    breaches: (o) => sql`select bin_id as what, quantity as off from bin_balances where outfit_id = ${o} and quantity < 0 limit 5`,
  },
  {
    rule: "Owed by yards equals what the posted tickets have not been paid",
    breaches: (o) => sql`
      select 'owed-by-yards' as what, off from (select
        coalesce((select balance_minor from account_balances where outfit_id = ${o} and account = 'owed-by-yards'), 0)
        - coalesce((select sum(total_minor - paid_minor) from tickets where outfit_id = ${o} and state in ('posted', 'paid')), 0) as off) t where off <> 0`,
  },
  {
    rule: "Every ticket's total equals its lines, and its payments what was paid",
    breaches: (o) => sql`
      select t.number as what, t.total_minor - t.tax_minor + t.fee_minor - t.difference_minor - coalesce(l.total, 0) as off from tickets t
      left join (select ticket_id, sum(amount_minor) as total from ticket_lines where outfit_id = ${o} group by ticket_id) l on l.ticket_id = t.id
      left join (select ticket_id, sum(amount_minor) as paid from ticket_payments where outfit_id = ${o} and voided_at is null group by ticket_id) p on p.ticket_id = t.id
      where t.outfit_id = ${o} and (t.total_minor - t.tax_minor + t.fee_minor - t.difference_minor <> coalesce(l.total, 0) or t.paid_minor <> coalesce(p.paid, 0)) limit 5`,
  },
  {
    rule: "No record is taken back twice, and every reversal undoes its original line by line",
    breaches: (o) => sql`
      select what, sum(quantity) as off from (
        select m.reverses_id as what, l.place, l.bin_id, l.pickup_id, l.grade_id, l.quantity from movements m join movement_lines l on l.outfit_id = m.outfit_id and l.movement_id = m.id
        where m.outfit_id = ${o} and m.reverses_id is not null
        union all
        select r.reverses_id, l.place, l.bin_id, l.pickup_id, l.grade_id, l.quantity from movements r join movement_lines l on l.outfit_id = r.outfit_id and l.movement_id = r.reverses_id
        where r.outfit_id = ${o} and r.reverses_id is not null
      ) t group by what, place, bin_id, pickup_id, grade_id having sum(quantity) <> 0 limit 5`,
  },
  {
    rule: "Nothing is dated in a month after the month was closed",
    breaches: (o) => sql`
      select e.id as what, e.occurred_on as off from entries e join months m on m.outfit_id = e.outfit_id and m.month = date_format(e.occurred_on, '%Y-%m')
      where e.outfit_id = ${o} and m.closed_at is not null and e.made_at > m.closed_at limit 5`,
  },
];

/** Checks every rule of the always-true list against an outfit's books. Reads only. */
export async function checkBooks(db: Reader, { outfitId }: { outfitId: string }): Promise<RuleResult[]> {
  const results: RuleResult[] = [];
  for (const { rule, breaches } of RULES) {
    const [rows] = (await db.execute(breaches(outfitId))) as unknown as [{ what: string; off: string }[]];
    const detail = rows.length === 0 ? "Holds." : rows.map((row) => `${row.what}: off by ${row.off}`).join("; ");
    results.push({ rule, holds: rows.length === 0, detail });
  }
  return results;
}
