"use client";

import Link from "next/link";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { SelectField, TextField } from "@/components/ui/field";
import { apiSend } from "@/lib/http/fetch";
import { usualIn } from "@/lib/people/places";
import { signUpSchema } from "@/lib/people/schema";
import { PasswordField } from "./password-field";
import { signInWithPassword } from "./sign-in-with-password";

type Values = {
  name: string;
  email: string;
  password: string;
  outfit: { name: string; country: string; currency: string; weightUnit: string; timeZone: string };
};
type Choice = { code: string; name: string };

/** Starting a ledger: who you are and what the outfit is. The country sets currency, unit and time zone, which can be changed. */
export function SignUpForm({ countries, currencies, timeZones }: { countries: Choice[]; currencies: string[]; timeZones: string[] }) {
  const { register, handleSubmit, setValue, getValues } = useForm<Values>({
    defaultValues: { name: "", email: "", password: "", outfit: { name: "", country: "US", currency: "USD", weightUnit: "lb", timeZone: "America/New_York" } },
    shouldFocusError: false,
  });
  const { submit, sending, errors, errorAt } = useApiForm<typeof signUpSchema, { slug: string }>({
    schema: signUpSchema,
    send: (input) => apiSend("/api/sign-up", { body: input }),
    onDone: async ({ slug }) => {
      const { email, password } = getValues();
      const problem = await signInWithPassword(email, password);
      window.location.assign(problem === null ? `/o/${slug}` : "/sign-in");
    },
  });
  const onCountry = (country: string) => {
    const usual = usualIn(country);
    const device = Intl.DateTimeFormat().resolvedOptions().timeZone;
    setValue("outfit.currency", usual?.currency ?? getValues("outfit.currency"));
    setValue("outfit.weightUnit", usual?.weightUnit ?? "kg");
    setValue("outfit.timeZone", timeZones.includes(device) ? device : (usual?.timeZone ?? "UTC"));
  };
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  return (
    <form noValidate className="account-form" onSubmit={handleSubmit((values) => submit(values as never))}>
      <h1>Start a ledger</h1>
      <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
      <TextField id="name" label="Your name" autoComplete="name" {...error("name")} {...register("name")} />
      <TextField
        id="email"
        label="Email"
        type="email"
        inputMode="email"
        autoComplete="username"
        autoCapitalize="none"
        {...error("email")}
        {...register("email")}
      />
      <PasswordField
        id="password"
        label="Password"
        hint="15 letters or more. Three or four words do well."
        autoComplete="new-password"
        error={errorAt("password")}
        {...register("password")}
      />
      <TextField id="outfit.name" label="Outfit name" autoComplete="organization" {...error("outfit.name")} {...register("outfit.name")} />
      <SelectField
        id="outfit.country"
        label="Country"
        autoComplete="country"
        {...error("outfit.country")}
        {...register("outfit.country", { onChange: (event: { target: { value: string } }) => onCountry(event.target.value) })}
      >
        {countries.map(({ code, name }) => (
          <option key={code} value={code}>
            {name}
          </option>
        ))}
      </SelectField>
      <details className="account-more">
        <summary>Currency, weight unit and time zone</summary>
        <p className="mut">They come from the country and stay fixed once anything is booked.</p>
        <SelectField id="outfit.currency" label="Currency" {...error("outfit.currency")} {...register("outfit.currency")}>
          {currencies.map((code) => (
            <option key={code}>{code}</option>
          ))}
        </SelectField>
        <SelectField id="outfit.weightUnit" label="Weight unit" {...error("outfit.weightUnit")} {...register("outfit.weightUnit")}>
          <option value="lb">Pounds (lb)</option>
          <option value="kg">Kilograms (kg)</option>
        </SelectField>
        <SelectField id="outfit.timeZone" label="Time zone" {...error("outfit.timeZone")} {...register("outfit.timeZone")}>
          {timeZones.map((name) => (
            <option key={name}>{name}</option>
          ))}
        </SelectField>
      </details>
      <BigButton verb="Start a ledger" busy={sending} />
      <p className="account-links">
        <Link className="link" href="/sign-in">
          Sign in instead
        </Link>
      </p>
    </form>
  );
}
