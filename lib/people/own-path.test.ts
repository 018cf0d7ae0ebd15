import { describe, expect, it } from "vitest";
import { ownPath } from "./own-path";

describe("after signing in", () => {
  it("a path of this site is followed", () => {
    expect(ownPath("/o/millrace-metals/tickets?state=unpaid")).toBe("/o/millrace-metals/tickets?state=unpaid");
  });

  it.each(["//elsewhere.example", "https://elsewhere.example", "/\\elsewhere.example", "javascript:alert(1)", "/o/x\n/y", "", "o/x", `/${"x".repeat(600)}`])(
    "%j leads nowhere",
    (text) => {
      expect(ownPath(text)).toBeNull();
    },
  );

  it("two answers are none", () => {
    expect(ownPath(["/a", "/b"])).toBeNull();
    expect(ownPath(undefined)).toBeNull();
  });
});
