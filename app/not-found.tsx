import type { Metadata } from "next";
import { AccountHead } from "@/components/ui/account-head";
import { Button } from "@/components/ui/button";

export const metadata: Metadata = { title: "Not here" };

/** A page that is not there, or is another outfit's: both answer alike. */
export default function NotFound() {
  return (
    <>
      <AccountHead />
      <main className="narrow-page" id="main">
        <h1>There is no such page</h1>
        <p>The address may be mistyped, or what stood here belongs to another outfit. Nothing in the books has changed.</p>
        <div>
          <Button href="/">Go to the start</Button>
        </div>
      </main>
    </>
  );
}
