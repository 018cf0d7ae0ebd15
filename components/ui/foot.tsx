import Link from "next/link";
import { footStations, type Station, type StationKey } from "./stations";

/** The line on a phone: five stations at the foot of the screen. */
export function Foot({ stations, current }: { stations: Station[]; current?: StationKey | null }) {
  return (
    <nav className="foot" aria-label="Stations">
      {stations
        .filter((station) => footStations.includes(station.key))
        .map((station) => (
          <Link key={station.key} href={station.href} aria-current={station.key === current ? "page" : undefined}>
            <span>
              {station.footFigure ?? station.figure}
              {station.footUnit ? <span className="u">{station.footUnit}</span> : null}
            </span>{" "}
            <b>{station.name}</b>
          </Link>
        ))}
    </nav>
  );
}
