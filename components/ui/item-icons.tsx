import type { ReactNode } from "react";

const box = "M4.5 3.5h23v25h-23z";
const coil = "M9 13h14M9 17h14M9 21h14";

const byKind: Record<string, ReactNode> = {
  "upright-vacuum": <path d="M4 24.5h15.5v4H4zM8.5 24.5 13.5 11l6 2.2-4.2 11.3M16.8 12l3.3-8.5h5M11.3 17l6 2.2" />,
  "canister-vacuum": <path d="M3 19.5h13v7H3zM5.5 26.5v2M13.5 26.5v2M16 21.5h4.5V6.5h5.5V3.5M18 28.5h10M24 28.5 26 6.5" />,
  "carpet-cleaner": <path d="M4 23.5h17v5H4zM7 23.5v-6h8l3 6M15 17.5 19.5 5.5h6.5M9 17.5v-5h5.5" />,
  "microwave-oven": <path d="M2.5 7.5h27v17h-27zM6 11h14v10H6zM23.5 12h3M23.5 16h3M23.5 20h3M5 24.5V27M27 24.5V27" />,
  dishwasher: (
    <>
      <path d={`${box}M4.5 9.5h23M8 6.5h6M23.5 6.5h1M7.5 25h17`} />
      <ellipse cx="11" cy="19" rx="1.8" ry="5" />
      <ellipse cx="16" cy="19" rx="1.8" ry="5" />
      <ellipse cx="21" cy="19" rx="1.8" ry="5" />
    </>
  ),
  "clothes-washer": (
    <>
      <path d={`${box}M4.5 9h23M8 6.3h4`} />
      <circle cx="16" cy="18.5" r="6.5" />
      <path d="M11 20c3-2.5 6 2 10-.5" />
    </>
  ),
  "clothes-dryer-electric": (
    <>
      <path d={`${box}M4.5 9h23M20 6.3h4`} />
      <circle cx="16" cy="18.5" r="6.5" />
      <path d="M13.5 22v-7M16 22v-7M18.5 22v-7" />
    </>
  ),
  refrigerator: <path d="M7.5 2.5h17v26h-17zM7.5 11.5h17M11 6v3M11 14.5v6M10 28.5V30M22 28.5V30" />,
  "chest-freezer": <path d="M2.5 11.5h27v15h-27zM2.5 11.5 5 6.5h22l2.5 5M14 8.8h4M5 26.5v2M27 26.5v2" />,
  "window-air-conditioner": <path d="M2.5 7.5h27v17h-27zM6 11.5h13M6 15h13M6 18.5h13M23 7.5v17M25.5 12h1.5M25.5 16h1.5" />,
  dehumidifier: <path d={`M7.5 3.5h17v25h-17zM7.5 22.5h17M10.5 7.5h11M10.5 11h11M10.5 14.5h11M14.5 25.5h3`} />,
  "electric-range": (
    <>
      <path d="M4.5 8.5h23v20h-23zM4.5 3.5h23v5M4.5 13.5h23M8 17h16v8H8z" />
      <path d="M9 11h1.5M14 11h1.5M19 11h1.5" />
    </>
  ),
  "range-hood": <path d="M12 3.5h8v8h-8zM12 11.5 3 20.5v4h26v-4l-9-9M3 20.5h26M13 22.5h6" />,
  "garbage-disposal": <path d="M11 3.5h10v4H11zM9 7.5h14v13l-3 8h-8l-3-8zM9 13.5H5v-5M9 17.5h14" />,
  "water-heater-electric": <path d="M8.5 4.5h15v23h-15zM12 4.5v-3M20 4.5v-3M8.5 10h15M17 13l-3 5h4l-3 5" />,
  "water-heater-gas": <path d="M8.5 6.5h15v21h-15zM13.5 6.5v-5h5v5M8.5 11h15M16 15c3 3.5 3.5 5 3.5 6.5a3.5 3.5 0 0 1-7 0c0-1.5 2-2.5 3.5-6.5z" />,
  "furnace-blower": (
    <>
      <path d="M25.5 16A9.5 9.5 0 1 1 16 6.5h12.5v7h-3" />
      <circle cx="16" cy="16" r="3.5" />
    </>
  ),
  "ceiling-fan": <path d="M16 2.5v8M12.5 10.5h7v4h-7zM12.5 11.5 2.5 9v5l10-.5M19.5 11.5l10-2.5v5l-10-.5M14 14.5h4v6h-4zM14.5 20.5v3h3v-3" />,
  "box-fan": (
    <>
      <path d="M4.5 4.5h23v23h-23z" />
      <circle cx="16" cy="16" r="8.5" />
      <path d="M16 16 10 11M16 16l7-3.5M16 16l-1 7.5M9 29.5h4M19 29.5h4" />
    </>
  ),
  "space-heater": <path d="M3.5 8.5h25v15h-25zM7 12.5h18M7 16h18M7 19.5h18M6 23.5v4M26 23.5v4" />,
  "tube-television": <path d="M3 9.5h26v17H3zM11 3l5 6 5-6M6.5 12.5h14q1.5 5.5 0 10.5h-14q-1.5-5.5 0-10.5zM24.5 14H26M24.5 18H26" />,
  "tube-monitor": <path d="M4 4.5h24v18H4zM7.5 8h17q1 5.5 0 11h-17q-1-5.5 0-11zM12 22.5v3H8.5v3h15v-3H20v-3" />,
  "flat-television": <path d="M2.5 6.5h27v16h-27zM5.5 9.5h21v10h-21zM16 22.5v4M9 27.5h14" />,
  "stereo-receiver": (
    <>
      <path d="M2.5 9.5h27v14h-27zM6 13h9v4H6zM5 23.5v2.5M27 23.5v2.5M6 20.5h1.5M10 20.5h1.5M14 20.5h1.5" />
      <circle cx="23" cy="16.5" r="3.5" />
    </>
  ),
  loudspeaker: (
    <>
      <path d="M8.5 2.5h15v27h-15z" />
      <circle cx="16" cy="20" r="5" />
      <circle cx="16" cy="20" r="1.5" />
      <circle cx="16" cy="8.5" r="2.5" />
    </>
  ),
  "game-console": <path d="M3.5 8.5h25v7h-25zM7 12h8M24 12h1.5M8 20.5h16l3 7h-5l-2-3h-8l-2 3H5zM11.5 23h3" />,
  "desktop-computer": <path d="M9 3.5h14v25H9zM12 7.5h8M12 11h8M12 24.5h4M12 21.5h4M20 24.5h.2" />,
  "laptop-computer": <path d="M6.5 5.5h19v14h-19zM9.5 8.5h13v8h-13zM6.5 19.5l-4 7h27l-4-7M13 23.5h6" />,
  printer: <path d="M9 12V3.5h14V12M3 12h26v11H3zM8.5 19h15v9.5h-15zM24 15.5h2" />,
  "battery-backup": <path d="M8.5 3.5h15v25h-15zM12 8h8M12 12h8M17 15.5l-3 4.5h4l-3 4.5" />,
  "network-gear": <path d="M2.5 16.5h27v9h-27zM7 16.5v-11M25 16.5v-11M7 21h1.5M11.5 21H13M16 21h1.5M21 21h4.5" />,
};

const byGroup: Record<string, ReactNode> = {
  "floor care": byKind["upright-vacuum"],
  kitchen: <path d={`${box}M4.5 10h23M8 6.8h5M8 14h16v11H8z`} />,
  laundry: byKind["clothes-washer"],
  "cooling & heating": <path d={`${box}${coil}M9 8h8`} />,
  "plumbing & building": <path d="M3 12.5h12v-9h7v9h7v7h-7v9h-7v-9H3z" />,
  "screens & sound": byKind["flat-television"],
  "office & computing": byKind["desktop-computer"],
};

const crate = <path d="M4 9.5h24v18H4zM4 15.5h24M4 21.5h24M10 9.5v18M22 9.5v18M8 9.5l3-5h10l3 5" />;

/** The drawing of an item kind: its own, else its group's, else a crate. */
export function ItemIcon({ kind, group }: { kind: string; group?: string }) {
  return (
    <svg className="pic" viewBox="0 0 32 32" aria-hidden="true">
      {byKind[kind] ?? (group ? byGroup[group] : undefined) ?? crate}
    </svg>
  );
}
