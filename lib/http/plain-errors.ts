import type * as z from "zod";
import type { FieldError } from "./errors";

type Issue = z.core.$ZodIssue;

const path = (parts: readonly PropertyKey[]) => parts.map(String).join(".");

function sentence(issue: Issue): string {
  // Our own fields carry their own words; zod's defaults start with these and are turned into plain ones.
  if (!/^(Invalid|Too |Unrecognized)/.test(issue.message)) return issue.message;
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined ? "Enter this." : `This must be ${issue.expected}.`;
    case "invalid_value":
      return `This must be one of: ${issue.values.map(String).join(", ")}.`;
    case "too_small":
      return `This must have ${issue.minimum} or more.`;
    case "too_big":
      return `This must have ${issue.maximum} or fewer.`;
    default:
      return "This is not in the right form.";
  }
}

/** The wrong fields of a parse, in plain words, each at its path. Unknown fields are named one by one. */
export function plainErrors(error: z.core.$ZodError): FieldError[] {
  return error.issues.flatMap((issue): FieldError[] =>
    issue.code === "unrecognized_keys"
      ? issue.keys.map((key) => ({ path: path([...issue.path, key]), message: "There is no such field here." }))
      : [{ path: path(issue.path), message: sentence(issue) }],
  );
}
