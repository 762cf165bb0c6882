import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Input, Question } from "@/components/ui/field";

afterEach(cleanup);

const wrong = "Ze must be a number, such as 0.21";

// The pattern of the GOV.UK Design System for error summaries (summary takes focus, links to the field, same words, title starts "Error: ").
describe("the error summary", () => {
  it("takes focus, links to the field in the same words, and marks the title", () => {
    document.title = "Intake, Sealwire";
    render(
      <>
        <ErrorSummary errors={[{ path: "ze", message: wrong }]} />
        <Question id="ze" label="External loop impedance, Ze" error={wrong}>
          <Input id="ze" defaultValue="o.21" unit="Ω" unitName="ohms" wrong aria-describedby="ze-error" />
        </Question>
      </>,
    );
    const summary = screen.getByRole("alert");
    expect(document.activeElement).toBe(summary);
    expect(document.title).toBe("Error: Intake, Sealwire");
    screen.getByRole("link", { name: wrong }).click();
    expect(document.activeElement).toBe(screen.getByLabelText("External loop impedance, Ze"));
    expect(document.getElementById("ze-error")?.textContent).toBe(wrong);
    expect((document.activeElement as HTMLInputElement).value).toBe("o.21");
  });

  it("gives the title back when nothing is wrong any more", () => {
    document.title = "Team, Sealwire";
    const { rerender } = render(<ErrorSummary errors={[{ path: "email", message: "Enter an e-mail address" }]} />);
    rerender(<ErrorSummary errors={[]} />);
    expect(document.title).toBe("Team, Sealwire");
    expect(screen.queryByRole("alert")).toBeNull();
  });
});
