import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { afterEach, describe, expect, it, vi } from "vitest";
import { Hand } from "@/components/submission/hand";
import type { SubmissionActs } from "@/components/submission/acts";
import { submissionMoves } from "@/lib/notify/submission";
import type { SubmissionView } from "@/lib/notify/views";

vi.mock("next/navigation", () => ({ useRouter: () => ({ refresh: vi.fn() }), unstable_rethrow: () => undefined }));
afterEach(cleanup);

const submission: SubmissionView = {
  id: "s1",
  jobId: "j1",
  jobNumber: "FEN-0125",
  site: "9 Harbour Row, Thrale",
  operatorId: "17",
  operatorName: "SSEN",
  purpose: "application",
  state: "submitted",
  channel: "e-mail",
  packId: "p1",
  packVersion: 1,
  packHash8: "7be2c01d",
  sentOn: "2026-11-16",
  workingDaysSinceSent: 10,
  dueOn: "2026-12-01",
  daysLeft: 0,
  nextStep: "Formal chase, day 10",
  reference: null,
  version: 4,
  history: [],
  packs: [{ id: "p1", version: 1, hash8: "7be2c01d" }],
  moves: submissionMoves("submitted", "application"),
  sendTo: { email: "connections@ssen.example.com", page: null },
  draft: { subject: "Decision on one chargepoint", body: "We applied on 16 November 2026." },
};

const acts = (over: Partial<SubmissionActs> = {}): SubmissionActs => {
  const done = vi.fn(async () => ({ status: "done" as const, value: null }));
  return { send: done, recordSent: done, recordMove: done, recordNote: done, ...over };
};

describe("a submission in hand", () => {
  it("sends the drafted message with the version and pack that were read", async () => {
    const send = vi.fn(async () => ({ status: "done" as const, value: null }));
    render(<Hand submission={submission} acts={acts({ send })} today="2026-12-01" />);
    fireEvent.click(screen.getByRole("button", { name: "Send chase" }));
    await waitFor(() =>
      expect(send).toHaveBeenCalledWith({
        submissionId: "s1",
        version: 4,
        packId: "p1",
        to: "connections@ssen.example.com",
        subject: "Decision on one chargepoint",
        body: "We applied on 16 November 2026.",
      }),
    );
  });

  it("sends no answer without words, and puts them in after what the operator asked", async () => {
    const send = vi.fn(async () => ({ status: "done" as const, value: null }));
    const draft = { subject: "Answer", body: "Dear connections team,\n\nYou asked.\n\nThe pack is attached." };
    const asked = {
      ...submission,
      state: "question" as const,
      moves: submissionMoves("question", "application"),
      draft,
    };
    render(<Hand submission={asked} acts={acts({ send })} today="2026-12-01" />);
    fireEvent.click(screen.getByRole("button", { name: "Send the answer" }));
    expect(screen.getByText("Write your answer")).toBeTruthy();
    expect(send).not.toHaveBeenCalled();
    fireEvent.change(screen.getByLabelText("Your answer"), { target: { value: "It is photo 3." } });
    fireEvent.click(screen.getByRole("button", { name: "Send the answer" }));
    const body = "Dear connections team,\n\nYou asked.\n\nIt is photo 3.\n\nThe pack is attached.";
    await waitFor(() => expect(send).toHaveBeenCalledWith(expect.objectContaining({ body })));
  });

  it("asks only what the operator's answer needs: an approval has a reference and a day, a limit has its amps", () => {
    render(<Hand submission={submission} acts={acts()} today="2026-12-01" />);
    fireEvent.click(screen.getByRole("button", { name: "Record a reply" }));
    const happened = screen.getByLabelText("What happened");
    fireEvent.change(happened, { target: { value: "approved" } });
    expect(screen.getByLabelText("Day of the decision")).toBeTruthy();
    expect(screen.queryByLabelText("Limit")).toBeNull();
    fireEvent.change(happened, { target: { value: "approved-with-limit" } });
    expect(screen.getByLabelText("Limit")).toBeTruthy();
  });

  it("offers no approval that the operator did not give: silence is never consent", () => {
    render(
      <Hand
        submission={{ ...submission, moves: submissionMoves("draft", "application"), state: "draft" }}
        acts={acts()}
        today="2026-12-01"
      />,
    );
    expect(screen.queryByRole("button", { name: "Record a reply" })).toBeNull();
    fireEvent.click(screen.getByRole("button", { name: "Withdraw" }));
    const options = within(screen.getByLabelText("What happened")).getAllByRole("option");
    expect(options.map(({ textContent }) => textContent)).toEqual(["Withdraw"]);
  });

  it("has nothing to chase once the operator has decided", () => {
    const decided = { ...submission, state: "approved" as const, moves: submissionMoves("approved", "application") };
    render(<Hand submission={decided} acts={acts()} today="2026-12-01" />);
    expect(screen.queryByRole("button", { name: "Chase" })).toBeNull();
    expect(screen.queryByRole("button", { name: "Send chase" })).toBeNull();
  });

  it("keeps what was typed when the record is refused, and says so at the field", async () => {
    const recordNote = vi.fn(async () => ({
      status: "failed" as const,
      message: "Some answers need another look.",
      fields: [{ path: "text", message: "Write what was said" }],
    }));
    render(<Hand submission={submission} acts={acts({ recordNote })} today="2026-12-01" />);
    fireEvent.click(screen.getByRole("button", { name: "Record a call" }));
    fireEvent.change(screen.getByLabelText("Spoke to"), { target: { value: "Robin, connections desk" } });
    fireEvent.click(screen.getByRole("button", { name: "Record the call" }));
    await screen.findByRole("alert");
    expect((screen.getByLabelText("Spoke to") as HTMLInputElement).value).toBe("Robin, connections desk");
    expect(screen.getAllByText("Write what was said")).toHaveLength(2);
  });

  it("gives a reader without the right to write no control", () => {
    render(<Hand submission={submission} acts={null} today="2026-12-01" />);
    expect(screen.queryAllByRole("button")).toHaveLength(0);
  });
});
