import type { Metadata } from "next";
import { SignUpForm } from "@/components/people/sign-up-form";
import { countries } from "@/lib/people/places";

export const metadata: Metadata = { title: "Start a ledger" };

/** Making a person and their outfit. */
export default function SignUpPage() {
  return <SignUpForm countries={countries()} currencies={Intl.supportedValuesOf("currency")} timeZones={[...Intl.supportedValuesOf("timeZone"), "UTC"]} />;
}
