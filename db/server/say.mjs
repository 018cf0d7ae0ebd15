/** Something a person has to put right. Shown as it stands, without a stack trace. */
export class Refusal extends Error {}

/** One line of progress. It goes to the error stream, so that a command's answer can be read by another program. */
export const say = (line = "") => process.stderr.write(`${line}\n`);

/** The last `count` lines of a text that say something. */
export const lastLines = (text, count) =>
  text
    .split("\n")
    .map((line) => line.trimEnd())
    .filter((line) => line.trim() !== "")
    .slice(-count);
