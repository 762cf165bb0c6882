import { cleanup, fireEvent, render, screen, waitFor } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { Verdict } from "@/components/review/verdict";

vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh: vi.fn() }), unstable_rethrow: () => undefined }));
afterEach(cleanup);

const done = () => vi.fn(async () => ({ status: "done" as const, value: null }));
const show = (notMet: number, cannotTell: number) => {
  const acts = { approve: done(), giveBack: done() };
  const tally = { met: 20, "not-met": notMet, "cannot-tell": cannotTell, "not-applicable": 4 };
  render(<Verdict reviewId="r1" version={2} tally={tally} recordedBy="Tam Orrell" acts={acts} />);
  return acts;
};

describe("the verdict on settings", () => {
  it("waits while something is not met, and says what for", () => {
    const { approve } = show(1, 1);
    expect(screen.getByText("Approve waits for 1 not met.")).toBeTruthy();
    fireEvent.click(screen.getByRole("button", { name: "Approve" }));
    expect(approve).not.toHaveBeenCalled();
  });

  it("leaves what cannot be told to a person, who must write how they judged", async () => {
    const { approve } = show(0, 2);
    fireEvent.click(screen.getByRole("button", { name: "Approve" }));
    expect(approve).not.toHaveBeenCalled();
    fireEvent.change(screen.getByRole("textbox"), { target: { value: "Seen on the maker's portal with the owner." } });
    fireEvent.click(screen.getByRole("button", { name: "Approve" }));
    await waitFor(() =>
      expect(approve).toHaveBeenCalledWith({
        reviewId: "r1",
        version: 2,
        note: "Seen on the maker's portal with the owner.",
      }),
    );
  });

  it("returns with the reason that was typed", async () => {
    const { giveBack } = show(1, 0);
    fireEvent.change(screen.getByRole("textbox"), { target: { value: "R10-1: set the clock to local time." } });
    fireEvent.click(screen.getByRole("button", { name: "Return to Tam Orrell" }));
    await waitFor(() =>
      expect(giveBack).toHaveBeenCalledWith({
        reviewId: "r1",
        version: 2,
        reason: "R10-1: set the clock to local time.",
      }),
    );
  });
});
