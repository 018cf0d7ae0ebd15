"use client";

import { usePathname } from "next/navigation";
import { stationOrder, type StationKey } from "@/components/ui/stations";

/** A place beside the line that the top bar leads to. */
export type ShopKey = "prices" | "crew" | "settings";

const shopKeys: readonly ShopKey[] = ["prices", "crew", "settings"];

/** Which station, or which place of the top bar, an address inside an outfit belongs to. */
export function placeOf(pathname: string): { station: StationKey | null; shop: ShopKey | null } {
  const [, , , segment] = pathname.split("/");
  if (!segment) return { station: "today", shop: null };
  return {
    station: stationOrder.find((key) => key === segment) ?? null,
    shop: shopKeys.find((key) => key === segment) ?? null,
  };
}

/** The station or place the person is at now. */
export function useCurrentStation() {
  return placeOf(usePathname());
}
