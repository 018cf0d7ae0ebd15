/** The invented outfit: people, places, yards and figures. Nothing here is real, and no price comes from a market. */

export const OUTFIT = {
  name: "Millrace Metals",
  place: "Calder Falls",
  country: "US",
  currency: "USD",
  weightUnit: "lb",
  timeZone: "America/New_York",
} as const;

export const MONTHS = 14;

/** Days between a yard's sheets, and how far its prices lie from the middle, in parts of a thousand. */
export const YARDS = [
  {
    name: "Northgate Metals",
    place: "Northgate, by the rail yard",
    phone: "555-0141",
    hours: "Mon to Fri 7:30 to 16:30, Sat to noon",
    note: "Asks for ID. Pays by check. Clips its own drains.",
    every: 7,
    start: 2,
    lean: 1010,
  },
  {
    name: "Pell Street Scrap",
    place: "41 Pell Street",
    phone: "555-0166",
    hours: "Mon to Sat 8:00 to 17:00",
    note: "Cash up to its limit, check above. Good on brass and motors.",
    every: 9,
    start: 4,
    lean: 1002,
  },
  {
    name: "Tolliver & Sons",
    place: "Canal Road 9",
    phone: "555-0187",
    hours: "Mon to Fri 7:00 to 16:00",
    note: "Best on steel. Deducts for iron on motors.",
    every: 7,
    start: 0,
    lean: 994,
  },
  {
    name: "Canal Recycling",
    place: "Lock Basin 2",
    phone: "555-0103",
    hours: "Tue to Sat 9:00 to 17:00",
    note: "Takes boards and drives. Slow to change its sheet.",
    every: 14,
    start: 8,
    lean: 985,
  },
] as const;

/** Middle price at the start in thousandths of a dollar a pound, the step a sheet may move it, and which bins the outfit keeps of it. */
export const GRADES = [
  { key: "bare-bright", price: 3820, step: 70, bins: ["BB-1"], tare: 340, sellPoint: 100, wording: "BARE BRITE" },
  { key: "no1-copper", price: 3640, step: 65, bins: ["C1-1"], tare: 340, sellPoint: 120, wording: "#1 COPPER" },
  { key: "no2-copper", price: 3420, step: 60, bins: ["C2-1", "C2-2"], tare: 185, sellPoint: 300, wording: "#2 COPPER" },
  { key: "wire-high", price: 2040, step: 40, bins: ["IW-1"], tare: 185, sellPoint: 150, wording: "ICW 60" },
  { key: "wire-low", price: 1120, step: 30, bins: ["IL-1"], tare: 185, sellPoint: 150, wording: "ICW 40" },
  { key: "yellow-brass", price: 2310, step: 45, bins: ["YB-1"], tare: 340, sellPoint: 200, wording: "YEL BRASS" },
  { key: "copper-motor", price: 400, step: 12, bins: ["MO-1", "MO-2"], tare: 4200, sellPoint: 400, wording: "ELEC MOTORS MXD" },
  { key: "transformer-copper", price: 420, step: 12, bins: ["TR-1"], tare: 1150, sellPoint: 200, wording: "CU TRANSF" },
  { key: "sealed-unit", price: 190, step: 8, bins: ["SU-1"], tare: 4200, sellPoint: 500, wording: "SEALED UNITS" },
  { key: "clean-aluminum", price: 640, step: 18, bins: ["AL-1"], tare: 650, sellPoint: 200, wording: "AL SHEET" },
  { key: "cast-aluminum", price: 560, step: 16, bins: ["AC-1"], tare: 650, sellPoint: 200, wording: "AL CAST" },
  { key: "heat-sink", price: 760, step: 20, bins: ["HS-1"], tare: 185, sellPoint: 180, wording: "AL H/S CLEAN" },
  { key: "dirty-aluminum", price: 280, step: 10, bins: ["AD-1"], tare: 650, sellPoint: 200, wording: "AL BREAKAGE" },
  { key: "die-cast-zinc", price: 430, step: 12, bins: ["ZN-1"], tare: 340, sellPoint: 100, wording: "ZINC DC" },
  { key: "board-low", price: 180, step: 10, bins: ["BL-1"], tare: 185, sellPoint: 120, wording: "BOARDS LO" },
  { key: "board-mid", price: 1240, step: 40, bins: ["BM-1"], tare: 185, sellPoint: 80, wording: "BOARDS MID" },
  { key: "stainless-400", price: 160, step: 8, bins: ["SS-1"], tare: 650, sellPoint: 250, wording: "430 SS" },
  { key: "light-iron", price: 88, step: 4, bins: ["LI-1"], tare: 9800, sellPoint: 1000, wording: "LT IRON" },
  { key: "shred", price: 81, step: 4, bins: ["SH-1"], tare: 9800, sellPoint: 1500, wording: "SHRED" },
] as const;

/** What comes in, and how often of a hundred. */
export const FINDS = [
  { key: "clothes-washer", share: 14, most: 3 },
  { key: "clothes-dryer-electric", share: 11, most: 3 },
  { key: "dishwasher", share: 9, most: 2 },
  { key: "microwave-oven", share: 13, most: 5 },
  { key: "upright-vacuum", share: 12, most: 4 },
  { key: "desktop-computer", share: 9, most: 6 },
  { key: "printer", share: 8, most: 4 },
  { key: "electric-range", share: 7, most: 2 },
  { key: "water-heater-electric", share: 6, most: 3 },
  { key: "box-fan", share: 6, most: 4 },
  { key: "stereo-receiver", share: 5, most: 4 },
] as const;

/** Finds that wait for a record before anybody may cut them. */
export const HELD_FINDS = ["refrigerator", "tube-television"] as const;

export const STREETS = [
  "Alder Row",
  "Tannery Lane",
  "Quarry Road",
  "Mill Street",
  "Weir Lane",
  "Cooper's Yard",
  "Sluice Street",
  "Fuller's Close",
  "Lock Basin",
  "Chapel Bank",
] as const;

export const COSTS = [
  { kind: "fuel", every: 6, least: 3800, most: 7200, note: "Truck" },
  { kind: "disposal", every: 15, least: 4200, most: 11800, note: "Dump run" },
  { kind: "supplies", every: 24, least: 2100, most: 6400, note: "Blades, gloves, bags" },
  { kind: "repairs", every: 61, least: 4500, most: 21000, note: "Truck, shop tools" },
  { kind: "other", every: 30, least: 21400, most: 21400, note: "Truck insurance, one month" },
] as const;
