import { describe, expect, it } from "vitest";
import { nextStep, type ChaseInput } from "@/lib/notify/chase";

/** An application sent to SSEN in the north of Scotland on 16 November 2026: St Andrew’s Day is not counted there. */
const sent: ChaseInput = {
  purpose: "application",
  state: "acknowledged",
  division: "scotland",
  asAt: "2026-12-01",
  lastDay: null,
  sentOn: "2026-11-16",
  lastHeardOn: "2026-11-24",
  expires: null,
};

// Chase practice in working days (2, 5, 10, 20) is this program's own; no public source.
describe("the next step", () => {
  it("is the formal chase on the tenth working day of the operator’s division", () => {
    expect(nextStep(sent)).toEqual({
      text: "Chase formally, quoting the reference",
      dueOn: "2026-12-01",
      daysLeft: 0,
      late: false,
    });
    expect(nextStep({ ...sent, division: "england-and-wales" }).dueOn).toBe("2026-11-30");
  });

  it("looks for a bounce after two working days, then telephones", () => {
    const fresh: ChaseInput = { ...sent, state: "submitted", sentOn: "2026-11-27", lastHeardOn: null };
    expect(nextStep(fresh)).toMatchObject({ text: "No acknowledgement: look for a bounce", dueOn: "2026-12-02" });
    expect(nextStep({ ...fresh, lastHeardOn: "2026-12-02" })).toMatchObject({ dueOn: "2026-12-07" });
  });

  it("comes to the complaint route and stays there", () => {
    expect(nextStep({ ...sent, lastHeardOn: "2026-12-01" }).text).toMatch(/complaint/);
    expect(nextStep({ ...sent, asAt: "2027-03-01", lastHeardOn: "2027-02-01" })).toMatchObject({ late: true });
  });

  it("asks once whether a notice was recorded", () => {
    expect(nextStep({ ...sent, purpose: "demand-notice" }).text).toBe("Ask whether the notice was recorded");
  });

  it("warns of the last day while a paper is unsent", () => {
    const draft: ChaseInput = { ...sent, purpose: "demand-notice", state: "draft", sentOn: null, lastHeardOn: null };
    expect(nextStep({ ...draft, lastDay: "2026-12-18" })).toMatchObject({ text: "Send", daysLeft: 17 });
    expect(nextStep({ ...draft, lastDay: "2026-12-01" }).text).toBe("Send today, the last day");
    expect(nextStep({ ...draft, lastDay: "2026-11-20" })).toMatchObject({ daysLeft: -11, late: true });
    expect(nextStep(draft)).toEqual({ text: "Send", dueOn: null, daysLeft: null, late: false });
    expect(nextStep({ ...draft, purpose: "safety-report" }).text).toMatch(/Telephone/);
    expect(nextStep({ ...draft, state: "bounced", lastDay: "2026-12-18" }).text).toMatch(/address/);
    expect(nextStep({ ...draft, state: "queued" }).text).toMatch(/Leaving/);
  });

  it("follows what the operator said", () => {
    expect(nextStep({ ...sent, state: "question", lastHeardOn: "2026-11-30" }).dueOn).toBe("2026-12-02");
    expect(nextStep({ ...sent, state: "question", lastHeardOn: null }).dueOn).toBe("2026-12-03");
    expect(nextStep({ ...sent, state: "offer-open", expires: "2026-12-11" })).toMatchObject({
      dueOn: "2026-12-11",
      daysLeft: 10,
    });
    expect(nextStep({ ...sent, state: "approved" }).dueOn).toBeNull();
    expect(nextStep({ ...sent, state: "closed" }).text).toBe("Nothing");
    expect(nextStep({ ...sent, sentOn: null, lastHeardOn: null }).dueOn).toBe("2026-12-08");
  });
});
