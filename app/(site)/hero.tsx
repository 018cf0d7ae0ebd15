import { Button } from "@/components/ui/button";
import { Hatch } from "@/components/ui/hatch";
import { Sum } from "@/components/ui/ledger-table";

/** The promise, beside a grade tag as large as it gets. */
export function Hero() {
  return (
    <section className="hero">
      <div className="wrap">
        <div>
          <h1>Every pound, from the curb to the sale ticket.</h1>
          <p>
            Curbweight is the ledger for people who pick up dead appliances, take them apart and sell the metal by grade. It weighs what you have, checks what
            the yard paid and shows what the month left you.
          </p>
          <div className="cta">
            <Button href="/sign-up">Start a ledger</Button>
            <Button href="#path" variant="line">
              See how it works
            </Button>
          </div>
        </div>
        <div className="big">
          <div>
            <span />
            <Hatch family="copper" />
            <div className="tx">
              <h2>No. 2 copper</h2>
              <p className="where">Bin C2-2, Sat Nov 29</p>
              <div className="readout">
                <div className="row">
                  <div className="cell">
                    <span className="lab">gross</span>
                    <div className="dig">
                      14.25<span className="u">lb</span>
                    </div>
                  </div>
                  <div className="cell">
                    <span className="lab">tare</span>
                    <div className="dig">
                      1.85<span className="u">lb</span>
                    </div>
                  </div>
                </div>
                <div className="net">
                  <span className="lab">net</span>
                  <div className="dig">
                    12.40<span className="u">lb</span>
                  </div>
                </div>
              </div>
              <div className="worth">
                <span>
                  Northgate Metals,
                  <br />
                  sheet of Nov 26, $4.02
                </span>
                <Sum>$49.85</Sum>
              </div>
            </div>
          </div>
        </div>
      </div>
    </section>
  );
}
