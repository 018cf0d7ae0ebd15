import type { Station } from "@/components/ui/stations";
import type { Outfit } from "@/lib/auth/context";
import { formatMoney, formatMonth, formatShortDate, formatWeight } from "@/lib/format";
import type { LineFigures } from "@/lib/today/queries";

/** The eight stations of the line with their live figures. */
export function stationsOf(outfit: Pick<Outfit, "slug" | "currency" | "weightUnit">, today: string, figures: LineFigures): Station[] {
  const { currency, weightUnit, slug } = outfit;
  const at = (path: string) => `/o/${slug}${path}`;
  const { binsWeight, binsValueMinor, unpaidMinor, netMinor } = figures;
  const money = (minor: number) => formatMoney(minor, currency, { whole: true });
  return [
    { key: "today", name: "Today", href: at(""), figure: formatShortDate(today) },
    { key: "requests", name: "Requests", href: at("/requests"), figure: 0, unit: "new" },
    { key: "pickups", name: "Pickups", href: at("/pickups"), figure: figures.openPickups, unit: "to sort" },
    { key: "bench", name: "Bench", href: at("/bench"), figure: 0, unit: "open" },
    {
      key: "bins",
      name: "Bins",
      href: at("/bins"),
      figure: formatWeight(binsWeight),
      unit: weightUnit,
      footFigure: formatWeight(binsWeight, { places: 0 }),
      ...(binsValueMinor === null ? {} : { second: money(binsValueMinor) }),
    },
    { key: "loads", name: "Loads", href: at("/loads"), figure: 0, unit: "planned" },
    {
      key: "tickets",
      name: "Tickets",
      href: at("/tickets"),
      unit: "unpaid",
      ...(unpaidMinor === null ? { figure: figures.unpaidTickets } : { figure: formatMoney(unpaidMinor, currency), footFigure: money(unpaidMinor) }),
    },
    {
      key: "money",
      name: "Money",
      href: at("/money"),
      ...(netMinor === null
        ? { figure: money(figures.ownCostsMinor), unit: "your costs" }
        : { figure: money(netMinor), unit: `${formatMonth(today.slice(0, 7)).slice(0, 3)} net` }),
    },
  ];
}
