import { describe, expect, it } from "vitest";
import { hashPassword, passwordMatches } from "@/lib/auth/password";
import { signUpSchema } from "@/lib/people/schema";

const judged = (password: string): string[] => {
  const parsed = signUpSchema.safeParse({
    name: "Inez Corrigan",
    email: "inez.corrigan@millrace.example",
    password,
    outfit: { name: "Millrace Metals", country: "US", currency: "USD", weightUnit: "lb", timeZone: "America/New_York" },
  });
  return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join("."));
};

const WORDS64 = "kettle drawer pliers lantern ".repeat(3).slice(0, 60) + "zinc";

/** What NIST SP 800-63B-4 asks of a password alone: length counts, kinds of letters do not, and what is tried first is refused. */
const TABLE: [string, string, "taken" | "refused"][] = [
  ["nothing", "", "refused"],
  ["one letter", "k", "refused"],
  ["8 letters of every kind", "Xq7!mR2#", "refused"],
  ["14 letters", "kettle drawer!", "refused"],
  ["15 letters", "kettle drawers!", "taken"],
  ["16 letters", "kettle drawers!!", "taken"],
  ["small letters only", "kettledrawerlamp", "taken"],
  ["capitals only", "KETTLEDRAWERLAMP", "taken"],
  ["three words", "kettle drawer lamp", "taken"],
  ["four words", "pliers kettle drawer lamp", "taken"],
  ["spaces at both ends", " kettle drawers ", "taken"],
  ["64 letters", WORDS64, "taken"],
  ["128 letters", `${WORDS64}${[...WORDS64].reverse().join("")}`, "taken"],
  ["1,024 letters", [...Array(1024).keys()].map((i) => String.fromCodePoint(0x61 + ((i * i + 3 * i) % 23))).join(""), "taken"],
  ["1,025 letters", [...Array(1025).keys()].map((i) => String.fromCodePoint(0x61 + ((i * i + 3 * i) % 23))).join(""), "refused"],
  ["accents, 15 code points", "éclair über año", "taken"],
  ["accents, 14 code points in 19 bytes", "éclair über añ", "refused"],
  ["accents typed as two marks count as NFKC has them", "e\u0301clair u\u0308ber an\u0303", "refused"],
  ["Greek", "τραπέζι καρέκλα", "taken"],
  ["Chinese", "水壶抽屉钳子灯笼锌铜铝铁锡铅银", "taken"],
  ["14 emoji in 56 bytes", "🦊🐢🦉🐝🐙🦋🐌🦔🐸🦆🐿🦫🐞🦎", "refused"],
  ["15 emoji", "🦊🐢🦉🐝🐙🦋🐌🦔🐸🦆🐿🦫🐞🦎🐊", "taken"],
  ["15 times one emoji", "🦊".repeat(15), "refused"],
  ["marks of many kinds", "!@#$%^&*()_+-=[]{}", "taken"],
  ["spaces only", " ".repeat(20), "refused"],
  ["one letter again and again", "a".repeat(20), "refused"],
  ["three letters again and again", "abcabcabcabcabcabc", "refused"],
  ["digits in a row", "123456789012345", "refused"],
  ["the alphabet", "abcdefghijklmnop", "refused"],
  ["the keyboard", "qwertyuiopasdfgh", "refused"],
  ["a walk over the keyboard", "1qaz2wsx3edc4rfv", "refused"],
  ["a common word twice", "passwordpassword", "refused"],
  ["a common word and digits", "password12345678", "refused"],
  ["common words joined", "Letmein-Welcome-1", "refused"],
  ["a common sentence", "This is my password", "refused"],
  ["the comic's words", "correct horse battery staple", "refused"],
  ["the person's name", "Inez Corrigan 2026", "refused"],
  ["the outfit's name", "Millrace Metals 1", "refused"],
  ["the person's e-mail", "inez.corrigan@millrace.example", "refused"],
  ["the outfit's name among other words", "millrace lantern drawer", "taken"],
];

describe("A-3: which passwords are taken", () => {
  it("the table has its forty cases", () => {
    expect(TABLE).toHaveLength(40);
  });

  it.each(TABLE)("%s", (_name, password, verdict) => {
    const wrong = judged(password);
    if (verdict === "taken") expect(wrong).toEqual([]);
    else expect(new Set(wrong)).toEqual(new Set(["password"]));
  });
});

describe("how passwords are kept", () => {
  it("as argon2id, never twice alike", async () => {
    const [one, two] = await Promise.all([hashPassword("kettle drawers!"), hashPassword("kettle drawers!")]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(one).not.toBe(two);
  });

  it("V6.2.8: whole: two that differ in the last of 200 letters are two", async () => {
    const long = "é".repeat(40) + "kettle ".repeat(23);
    const kept = await hashPassword(`${long}a`);
    expect(await passwordMatches(kept, `${long}a`)).toBe(true);
    expect(await passwordMatches(kept, `${long}b`)).toBe(false);
  });

  it("the same letters from another keyboard are the same password", async () => {
    expect(await passwordMatches(await hashPassword("éclair über año"), "e\u0301clair u\u0308ber an\u0303o")).toBe(true);
  });

  it("nobody's password is never right, not even the decoy's own", async () => {
    expect(await passwordMatches(null, "a decoy for mailboxes that have no account")).toBe(false);
  });
});
