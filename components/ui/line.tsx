import Link from "next/link";
import type { Station, StationKey } from "./stations";

/** The line: the material's path from Today to Money under a graduated beam, for wide screens. */
export function Line({ stations, current }: { stations: Station[]; current?: StationKey | null }) {
  return (
    <nav className="line" aria-label="The line">
      {stations.map((station) => (
        <Link key={station.key} className="st" href={station.href} aria-current={station.key === current ? "page" : undefined}>
          <b>{station.name}</b>{" "}
          <span className="fig">
            {station.figure}
            {station.unit ? <span className={station.second ? "u keep" : "u"}> {station.unit}</span> : null}
            {station.second ? (
              <span className="second">
                <span className="dot">·</span>
                {station.second}
              </span>
            ) : null}
          </span>
        </Link>
      ))}
    </nav>
  );
}
