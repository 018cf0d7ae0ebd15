import { Brand } from "./mark";
import { HatchStrip } from "./hatch";

/** The head of the pages before an outfit: the name on ink, what it is, and the seven hatches. */
export function AccountHead() {
  return (
    <header>
      <div className="account-head">
        <Brand href="/" />
        <p>The ledger for small scrap outfits.</p>
      </div>
      <HatchStrip />
    </header>
  );
}
