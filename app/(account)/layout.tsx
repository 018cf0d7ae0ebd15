import type { ReactNode } from "react";
import { AccountHead } from "@/components/ui/account-head";

/** The frame of the pages before an outfit. */
export default function AccountLayout({ children }: { children: ReactNode }) {
  return (
    <div className="phone account">
      <AccountHead />
      <main className="account-body">{children}</main>
    </div>
  );
}
