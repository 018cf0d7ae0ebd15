import type { Metadata } from "next";
import { MoneyNav } from "@/components/money/money-nav";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { Verdict } from "@/components/ui/verdict";
import { pageContextFor } from "@/lib/auth/page";
import { formatTime } from "@/lib/format";
import { seeBooksCheck } from "@/lib/money/service";

export const metadata: Metadata = { title: "Books check" };

/** What must always be true of the books, checked against every line of them when the page is opened. */
export default async function BooksCheckPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "books.see");
  const { items, holds } = await seeBooksCheck(ctx);
  const broken = items.filter((item) => !item.holds).length;
  return (
    <div className="page">
      <PageHead title="Books check" fact={`Checked just now, at ${formatTime(ctx.now, ctx.outfit.timeZone)}, against every line of both books.`} />
      <MoneyNav slug={slug} current="check" />
      <Panel
        title={holds ? "Both books hold" : broken === 1 ? "One rule is broken" : `${broken} rules are broken`}
        sub={holds ? `${items.length} rules` : "Do not correct it by hand. Keep a backup and report it."}
      >
        <ul className="rules">
          {items.map((item) => (
            <li key={item.rule}>
              <Verdict tone={item.holds ? "ok" : "bad"} mark={item.holds ? "check" : "scale"} words={item.holds ? "holds" : "broken"} />
              <div>
                <b>{item.rule}</b>
                {item.holds ? null : <p>{item.detail}</p>}
              </div>
            </li>
          ))}
        </ul>
      </Panel>
    </div>
  );
}
