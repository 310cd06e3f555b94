import { describe, expect, it, vi } from "vitest";
import { ApiProblem } from "@/lib/api-client.ts";
import { fieldOfPointer, landProblem, messageOf } from "@/lib/form-problem.ts";

const refused = (errors: { pointer: string; detail: string }[]) =>
  new ApiProblem("validation_failed", "Check the highlighted fields.", {
    type: "/problems/validation",
    title: "Check the highlighted fields.",
    status: 422,
    code: "validation_failed",
    errors,
  });

describe("fieldOfPointer", () => {
  // RFC 6901, section 4: ~1 is a slash and ~0 a tilde, in that order.
  it.each([
    { pointer: "/text", field: "text" },
    { pointer: "/brief/widthMm", field: "brief.widthMm" },
    { pointer: "/a~1b/m~0n/~01", field: "a/b.m~n.~1" },
  ])("$pointer is $field", ({ pointer, field }) => expect(fieldOfPointer(pointer)).toBe(field));
});

describe("landProblem", () => {
  it("puts each reason under its field and focuses the first", () => {
    const setError = vi.fn();
    const words = landProblem<{ brief: { widthMm: number }; title: string }>(
      refused([
        { pointer: "/brief/widthMm", detail: "Too wide." },
        { pointer: "/title", detail: "Too long." },
      ]),
      setError,
      ["title", "brief.widthMm"],
    );
    expect(setError.mock.calls.map(([field, { message }]) => [field, message])).toEqual([
      ["brief.widthMm", "Too wide."],
      ["title", "Too long."],
    ]);
    expect(words).toBe("Check the highlighted fields.");
  });

  it("loses no reason whose field is not shown", () => {
    const setError = vi.fn();
    const words = landProblem<{ title: string }>(refused([{ pointer: "/clientId", detail: "Gone." }]), setError, [
      "title",
    ]);
    expect(setError).not.toHaveBeenCalled();
    expect(words).toBe("Check the highlighted fields. Gone.");
  });
});

it("says of our own mistakes that nothing was sent, never their text", () => {
  expect(messageOf(new TypeError("x is undefined"))).toBe(
    "Something went wrong on this page. Nothing was sent. Try again.",
  );
});
