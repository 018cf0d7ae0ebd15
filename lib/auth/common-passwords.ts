/**
 * Words that people use when a password must be long: fifteen characters or more made of these alone are refused. Common practice; the
 * list is from memory, so it also refuses by pattern (repeats, runs, the person's own words).
 */
const COMMON_STARTS = [
  "password",
  "passw0rd",
  "qwerty",
  "letmein",
  "iloveyou",
  "welcome",
  "administrator",
  "changeme",
  "trustno1",
  "football",
  "baseball",
  "sunshine",
  "princess",
  "monkey",
  "dragon",
  "master",
  "superman",
  "secret",
  "abc123",
  "correct horse battery staple",
  "thisismypassword",
  "thequickbrownfox",
  "jumpsoverthelazydog",
  "1q2w3e4r5t6y7u8i9o0p",
  "1qaz2wsx3edc4rfv",
  "qazwsxedcrfvtgb",
  "zaq12wsxcde34rfv",
];
const RUNS = ["abcdefghijklmnopqrstuvwxyz", "01234567890123456789", "98765432109876543210", "qwertyuiopasdfghjklzxcvbnm", "qwertyuiop[]asdfghjkl"];

const bare = (text: string) =>
  text
    .normalize("NFKC")
    .toLowerCase()
    .replaceAll(/[^\p{L}\p{N}]/gu, "");

/** Whether a password of enough length is still one that an attacker tries first: common words, runs, repeats, or the person's own words. */
export function isCommonPassword(password: string, ownWords: string[] = []): boolean {
  const plain = bare(password);
  const marks = new Set(password.normalize("NFKC").replaceAll(/\s/gu, ""));
  if (marks.size < 5) return true;
  // Marks and pictures alone are a password like any other, if they are not the same few again and again.
  if (plain.length < 8) return marks.size < 8;
  const half = plain.slice(0, Math.ceil(plain.length / 2));
  if (RUNS.some((run) => run.includes(plain) || (run.includes(half) && run.includes(plain.slice(half.length))))) return true;
  for (let size = 1; size <= plain.length / 2; size += 1) {
    if (plain.length % size === 0 && plain === plain.slice(0, size).repeat(plain.length / size)) return true;
  }
  const known = [...COMMON_STARTS, ...ownWords].map(bare).filter((word) => word.length >= 4);
  let rest = plain;
  for (const word of known.sort((a, b) => b.length - a.length)) rest = rest.replaceAll(word, "");
  return rest.replaceAll(/[\p{N}]/gu, "").length < 5 && rest !== plain;
}
