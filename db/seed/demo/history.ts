import { addDays, shiftMonth } from "@/lib/clock";
import { COSTS, FINDS, GRADES, HELD_FINDS, MONTHS, STREETS, YARDS } from "./figures";
import { hundredths, thousandths, Random } from "./random";

/** What happened on one day, in order. Ids are those of the outfit's own rows; `who` is the demo role that did it. */
export type Happening =
  | { what: "sheet"; yard: number; lines: { grade: string; price: string }[] }
  | {
      what: "pickup";
      ref: number;
      source: "curb" | "call-out" | "drop-off" | "bought";
      place: string;
      paidMinor: number;
      items: { kind: string; count: number }[];
    }
  | { what: "weigh-in"; pickup: number; grade: string; bin: string; gross: string; tare: string }
  | { what: "work-out"; pickup: number }
  | { what: "count"; bin: string; lossHundredths: number }
  | { what: "sale"; yard: number; number: string; grades: string[]; payAfter: number | null; short: boolean }
  | { what: "cost"; kind: (typeof COSTS)[number]["kind"]; amountMinor: number; note: string };

export type Day = { on: string; happenings: Happening[] };

/** Weight of each grade in one item of a kind, in hundredths of a pound, from its breakdown sheet. */
export type Yield = Map<string, Map<string, number>>;

/** How likely a find is, laid out as a hundred tickets to draw from. */
const HAT = FINDS.flatMap((find) => Array.from({ length: find.share }, () => find));

/** In hundredths of a pound. */
const WORTH_WEIGHING = 900;

const weekday = (on: string) => new Date(`${on}T00:00:00Z`).getUTCDay();

/** Prices that move a little with every sheet, the same for all yards but for each yard's lean. */
class Market {
  private readonly middle = new Map<string, number>(GRADES.map((grade) => [grade.key, grade.price]));

  constructor(private readonly random: Random) {}

  drift(): void {
    for (const { key, price, step } of GRADES) {
      const now = this.middle.get(key) ?? price;
      // A little more up than down, and pulled back when it strays too far from where it started.
      const pull = now > (price * 5) / 4 ? -step : now < (price * 4) / 5 ? step : Math.trunc(step / 8);
      this.middle.set(key, now + this.random.between(-step, step) + pull);
    }
  }

  sheet(yard: (typeof YARDS)[number]): { grade: string; price: string }[] {
    return GRADES.map(({ key, price }) => {
      const near = Math.trunc(((this.middle.get(key) ?? price) * (yard.lean + this.random.between(-12, 12))) / 1000);
      // Dear grades are quoted in whole cents, steel in tenths of a cent.
      return { grade: key, price: thousandths(near >= 120 ? Math.trunc(near / 10) * 10 : near) };
    });
  }
}

type Open = { ref: number; on: string; items: { kind: string; count: number }[] };

/** The fourteen months as a list of days, oldest first: the same for a given last day. */
export function historyUntil(lastDay: string, yields: Yield): Day[] {
  const random = new Random(20_931);
  const market = new Market(random);
  const first = `${shiftMonth(lastDay.slice(0, 7), -(MONTHS - 1))}-01`;
  const days: Day[] = [];
  const open: Open[] = [];
  const held = new Map<string, number>();
  const gathered = new Map<string, number>();
  const bin = new Map<string, number>();
  let ref = 0;
  let paper = 20_100;
  let day = 0;

  const haul = (on: string): Happening => {
    const source = random.pick(["curb", "curb", "curb", "call-out", "call-out", "drop-off", "bought"] as const);
    const items = new Map<string, number>();
    for (let left = random.between(3, 5); left > 0; left -= 1) {
      const find = random.pick(HAT);
      items.set(find.key, Math.min((items.get(find.key) ?? 0) + random.between(2, find.most + 2), 12));
    }
    ref += 1;
    const list = [...items].map(([kind, count]) => ({ kind, count }));
    open.push({ ref, on, items: list });
    const paidMinor = source === "bought" ? random.between(12, 48) * 100 : source === "call-out" && random.chance(20) ? random.between(5, 15) * 100 : 0;
    return { what: "pickup", ref, source, place: `${random.pick(STREETS)}, by no. ${random.between(2, 88)}`, paidMinor, items: list };
  };

  const heldHaul = (): Happening => {
    ref += 1;
    return {
      what: "pickup",
      ref,
      source: "call-out",
      place: `${random.pick(STREETS)}, by no. ${random.between(2, 88)}`,
      paidMinor: 0,
      items: [{ kind: random.pick(HELD_FINDS), count: 1 }],
    };
  };

  const work = (haulDone: Open): Happening[] => {
    const sums = new Map<string, number>();
    for (const { kind, count } of haulDone.items) {
      for (const [grade, weight] of yields.get(kind) ?? [])
        sums.set(grade, (sums.get(grade) ?? 0) + Math.trunc((weight * count * random.between(78, 104)) / 100));
    }
    const weighed = GRADES.flatMap((grade): Happening[] => {
      // Small parts gather on the bench until they are worth a walk to the scale.
      const net = (gathered.get(grade.key) ?? 0) + (sums.get(grade.key) ?? 0);
      gathered.set(grade.key, net < WORTH_WEIGHING ? net : 0);
      if (net < WORTH_WEIGHING) return [];
      // The shop's floor scale reads in steps of 0.2 lb, like the yards'.
      const rounded = Math.trunc(net / 20) * 20;
      const label = grade.bins[(bin.get(grade.key) ?? 0) % grade.bins.length] ?? grade.bins[0];
      held.set(grade.key, (held.get(grade.key) ?? 0) + rounded);
      return [{ what: "weigh-in", pickup: haulDone.ref, grade: grade.key, bin: label, gross: hundredths(rounded + grade.tare), tare: hundredths(grade.tare) }];
    });
    return [...weighed, { what: "work-out", pickup: haulDone.ref }];
  };

  const sale = (on: string): Happening[] => {
    // What is ripe goes; a run that would carry next to nothing stays home.
    const ripe = GRADES.filter((grade) => (held.get(grade.key) ?? 0) * 100 >= grade.sellPoint * 100 * random.between(35, 70)).map((grade) => grade.key);
    if (ripe.length < 3) return [];
    for (const key of ripe) {
      held.set(key, 0);
      bin.set(key, (bin.get(key) ?? 0) + 1);
    }
    const yard = random.pick([0, 0, 1, 1, 2, 2, 3]);
    paper += random.between(3, 29);
    const recent = addDays(lastDay, -6) <= on;
    return [{ what: "sale", yard, number: String(paper), grades: ripe, payAfter: recent ? null : random.pick([0, 0, 2, 3, 5]), short: random.chance(12) }];
  };

  for (let on = first; on <= lastDay; on = addDays(on, 1), day += 1) {
    const happenings: Happening[] = [];
    const open7 = weekday(on) !== 0;
    if (day % 7 === 0) market.drift();
    YARDS.forEach((yard, index) => {
      if (day % yard.every === yard.start % yard.every) happenings.push({ what: "sheet", yard: index, lines: market.sheet(yard) });
    });
    if (open7) {
      for (let count = random.pick([0, 1, 1, 1, 2]); count > 0; count -= 1) happenings.push(haul(on));
      // Yesterday's and older hauls are worked; the last few days still stand in the pile.
      while (open[0] && open[0].on < addDays(on, -1) && open[0].on < addDays(lastDay, -4)) {
        const done = open.shift();
        if (done) happenings.push(...work(done));
      }
      if ([2, 5].includes(weekday(on))) happenings.push(...sale(on));
    }
    if (addDays(lastDay, -2) === on) happenings.push(heldHaul());
    COSTS.forEach((cost, index) => {
      if (day % cost.every === index + 1)
        happenings.push({ what: "cost", kind: cost.kind, amountMinor: random.between(cost.least, cost.most), note: cost.note });
    });
    if (day > 20 && day % 37 === 0) happenings.push({ what: "count", bin: random.pick(GRADES).bins[0], lossHundredths: random.between(1, 9) * 20 });
    days.push({ on, happenings });
  }
  return days;
}
