import type { Metadata } from "next";
import Link from "next/link";
import { redirect } from "next/navigation";
import { SignOutButton } from "@/components/today/sign-out-button";
import { pagePerson } from "@/lib/auth/page";
import { seeMe } from "@/lib/people/service";

export const metadata: Metadata = { title: "Your outfits" };

/** Where a person goes after signing in: straight into their one outfit, or to choose among several. */
export default async function OutfitsPage() {
  const person = await pagePerson();
  if (!person) redirect("/sign-in");
  const { outfits } = await seeMe(person);
  if (outfits.length === 1 && outfits[0]) redirect(`/o/${outfits[0].slug}`);
  return (
    <div className="account-form">
      <h1>{outfits.length === 0 ? "You belong to no outfit" : "Your outfits"}</h1>
      {outfits.length === 0 ? <p>Ask an owner for a link to join, or start a ledger of your own with another email.</p> : null}
      <ul className="grid gap-2">
        {outfits.map((outfit) => (
          <li key={outfit.slug}>
            <Link className="btn big" href={`/o/${outfit.slug}`}>
              {outfit.name}
              <small>{outfit.role}</small>
            </Link>
          </li>
        ))}
      </ul>
      <SignOutButton />
    </div>
  );
}
