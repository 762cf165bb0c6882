import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { Mark, OutcomeGlyph, Tally, outcomeWord } from "@/components/ui/mark";
import { outcomes } from "@/lib/notify/result";

afterEach(cleanup);

describe("outcome marks", () => {
  it("always carry a word", () => {
    for (const outcome of outcomes) {
      render(<Mark outcome={outcome} />);
      expect(screen.getByText(outcomeWord[outcome])).toBeTruthy();
    }
  });

  it("have four different silhouettes, so that colour is never alone (WCAG 2.2, 1.4.1)", () => {
    const drawings = outcomes.map((outcome) => render(<OutcomeGlyph outcome={outcome} />).container.innerHTML);
    expect(new Set(drawings).size).toBe(outcomes.length);
  });

  it("say each count's word to a screen reader, and show what needs a person before what does not", () => {
    const { container } = render(<Tally counts={{ met: 25, "not-met": 1, "cannot-tell": 2, "not-applicable": 1 }} />);
    expect(container.textContent).toBe("1 not met2 cannot tell");
  });
});
