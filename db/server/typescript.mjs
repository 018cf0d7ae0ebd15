// Loaded with `node --import` before the project's own commands, which are TypeScript files.
import "tsx";
import { register } from "node:module";

register("./server-only.mjs", import.meta.url);

// What a command cannot handle is told in one line: the innermost cause, which is the database's own words when it was the database.
process.once("uncaughtException", (error) => {
  let cause = error;
  while (cause?.cause instanceof Error) cause = cause.cause;
  process.stderr.write(`${cause?.sqlMessage ?? (cause?.message || cause?.code) ?? cause}\n`);
  if (process.env.DEBUG) process.stderr.write(`${error?.stack}\n`);
  process.exit(1);
});
