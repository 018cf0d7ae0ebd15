import { Button } from "@/components/ui/button";
import { Hatch } from "@/components/ui/hatch";

const path = [
  ["Requests", "Someone calls with a dryer in the garage. Write down where and when."],
  ["Pickups", "Count the haul at the curb, one tap an item."],
  ["Bench", "Open a breakdown sheet and see which parts pay."],
  ["Bins", "Weigh each grade. Tare comes off by itself."],
  ["Loads", "Fill a truck for the yard that pays best today."],
  ["Tickets", "Hold the yard’s paper against your own scale."],
  ["Money", "Close the month and see what an hour earned."],
] as const;

const families = [
  ["copper", "Copper"],
  ["wire", "Insulated wire"],
  ["brass", "Brass"],
  ["aluminum", "Aluminum"],
  ["lead-zinc", "Lead & zinc"],
  ["electronics", "Electronics"],
  ["steel", "Steel & iron"],
] as const;

/** The material's path, station by station. */
export function PathSection() {
  return (
    <section className="path" id="path" aria-label="How it works">
      <div className="wrap">
        <ul>
          {path.map(([name, words]) => (
            <li key={name}>
              <b>{name}</b>
              <p>{words}</p>
            </li>
          ))}
        </ul>
      </div>
    </section>
  );
}

/** The seven hatches, named. */
export function FamiliesSection() {
  return (
    <section className="fams">
      <div className="wrap">
        <div className="sec">
          <h2>Seven families, seven hatches</h2>
          <p>
            Drafting tables had it solved: every material gets its own line pattern. Tags, bars and flows carry the same hatch, so a chart still reads in black
            and white, in poor light or without color vision.
          </p>
        </div>
        <ul>
          {families.map(([family, name]) => (
            <li key={family}>
              <Hatch family={family} />
              <b>{name}</b>
            </li>
          ))}
        </ul>
      </div>
    </section>
  );
}

/** The last word: start, and what not to expect. */
export function EndSection() {
  return (
    <section className="end">
      <div className="wrap">
        <div>
          <h2>Bring one month of tickets and see where it went.</h2>
          <Button href="/sign-up">Start a ledger</Button>
        </div>
        <div>
          <h3>What it does not do</h3>
          <ul>
            <li>It does not sell your metal or rank yards for a fee.</li>
            <li>It does not replace a certified scale.</li>
            <li>It does not give legal advice on refrigerant or waste.</li>
          </ul>
        </div>
      </div>
    </section>
  );
}

/** Says what is invented on this page. */
export function SiteFooter() {
  return (
    <footer>
      <div className="wrap">
        <span>Curbweight</span>
        <p>Yards, bins and figures on this page are invented.</p>
      </div>
    </footer>
  );
}
