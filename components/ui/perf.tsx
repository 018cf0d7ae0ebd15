/** The tear line between two parts of a ticket. */
export function Perf() {
  return <hr className="perf" aria-hidden="true" />;
}
