import { Caution } from "@/components/ui/caution";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { GradeTag } from "@/components/ui/tag";

/** A ticket held against the scale, with invented lines that add up. */
export function TicketsSection() {
  return (
    <section className="sec" id="tickets">
      <h2>The yard’s paper against your scale</h2>
      <p>Type the ticket as the yard wrote it. Each line is held against your load and the price sheet, and the difference is named in pounds and dollars.</p>
      <div className="panel">
        <LedgerTable caption="An invented ticket: our weight, the yard’s weight and the verdict, line by line" rows="roomy">
          <thead>
            <tr>
              <Th>Grade</Th>
              <Th numeric>Ours lb</Th>
              <Th numeric>Theirs lb</Th>
              <Th>Verdict</Th>
            </tr>
          </thead>
          <tbody>
            <tr>
              <RowHead>
                <GradeTag family="copper" name="No. 2 copper" />
              </RowHead>
              <Td numeric>59.0</Td>
              <Td numeric>58.8</Td>
              <Td className="ok">
                <b>within 0.5%</b>
              </Td>
            </tr>
            <tr>
              <RowHead>
                <GradeTag family="motors" name="Copper-bearing motor" />
              </RowHead>
              <Td numeric>192.0</Td>
              <Td numeric>188.0</Td>
              <Td className="bad">
                <b>short 4.0 lb</b>
              </Td>
            </tr>
            <tr>
              <RowHead>
                <GradeTag family="aluminum" name="Clean aluminum heat sink" />
              </RowHead>
              <Td numeric>22.8</Td>
              <Td numeric>22.8</Td>
              <Td className="ok">
                <b>agrees</b>
              </Td>
            </tr>
          </tbody>
          <tfoot>
            <tr>
              <RowHead>3 lines</RowHead>
              <Td numeric>
                <Sum>273.8</Sum>
              </Td>
              <Td numeric>
                <Sum>269.6</Sum>
              </Td>
              <Td className="bad">−4.2 lb</Td>
            </tr>
          </tfoot>
        </LedgerTable>
      </div>
    </section>
  );
}

/** What a hazard looks like, wherever one stands in the way. */
export function SafetySection() {
  return (
    <section className="sec" id="safety">
      <h2>Hazard first, then the metal</h2>
      <p>A breakdown sheet says where the metal hides and how to test it. What can hurt you comes first, and always looks like this.</p>
      <Caution
        level={3}
        title="Microwave, before the cover comes off"
        lines={[
          "The capacitor holds a charge after unplugging. It can kill.",
          "Do not break the pink or white magnetron ceramic.",
          "Wear eye protection and cut gloves.",
        ]}
      />
    </section>
  );
}
