import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { useState } from "react";
import { afterEach, describe, expect, it } from "vitest";
import type { Held } from "@/components/drafts/draft-state";
import { factAt, withFact } from "@/components/drafts/facts-at";
import { QuestionAnswer } from "@/components/job/fields/question-answer";
import { placeOf } from "@/components/job/questions/screens";
import { parseDraft, type Job } from "@/lib/notify/job";

function record(facts: object = {}): Job {
  const parsed = parseDraft({
    format: "sealwire.job/1",
    jobNumber: "FEN-0001",
    stage: "installed",
    circuits: [{ id: "main" }],
    chargepoints: [{ id: "cp1" }],
    ...facts,
  });
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
  return parsed.value;
}

/** One question with a record of its own; `seen` is what it holds after each change. */
function Asked({ path, job, seen }: { path: string; job: Job; seen: { value: unknown; held: Held | null } }) {
  const [now, setNow] = useState(job);
  const [held, setHeld] = useState<Held | null>(null);
  const question = placeOf(path, now)?.screen?.questions.find(({ at }) => at === path);
  if (!question) return <p>not asked</p>;
  return (
    <QuestionAnswer
      question={question}
      index={0}
      job={now}
      value={factAt(now, path)}
      held={held}
      wrong={null}
      thread={{ stitch: "not-yet", wire: "ahead" }}
      today="2026-12-01"
      edit={(at, value) => {
        setHeld(null);
        setNow(withFact(now, at, value));
        Object.assign(seen, { value, held: null });
      }}
      hold={(_at, typed, message) => {
        setHeld({ typed, message });
        Object.assign(seen, { held: { typed, message } });
      }}
    />
  );
}

function ask(path: string, facts: object = {}) {
  const seen: { value: unknown; held: Held | null } = { value: undefined, held: null };
  render(<Asked path={path} job={record(facts)} seen={seen} />);
  return seen;
}
const type = (label: string | RegExp, text: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } });

afterEach(cleanup);

describe("a field", () => {
  it("takes a figure, and says what is wrong with one that is none, keeping it as typed", () => {
    const seen = ask("supply.externalLoopImpedanceOhm");
    type("External loop impedance, Ze", "0.21");
    expect(seen.value).toBe(0.21);
    type("External loop impedance, Ze", "o.21");
    expect(seen.held?.typed).toBe("o.21");
    expect(screen.getByText("External loop impedance, Ze must be a number, such as 0.21")).toBeTruthy();
    expect((screen.getByLabelText("External loop impedance, Ze") as HTMLInputElement).value).toBe("o.21");
  });

  it("says at once what not knowing leads to", () => {
    const seen = ask("supply.looped");
    fireEvent.click(screen.getByLabelText("Not known"));
    expect(seen.value).toBe("unknown");
    expect(screen.getByText("Not known means apply first.")).toBeTruthy();
  });

  it("takes a choice back when it is pressed again", () => {
    const seen = ask("supply.looped", { supply: { looped: "no" } });
    fireEvent.click(screen.getByLabelText("No"));
    expect(seen.value).toBeNull();
  });

  it("lets one condition stand alone and the others together", () => {
    const seen = ask("supply.serviceConditions");
    fireEvent.click(screen.getByLabelText("Sound"));
    fireEvent.click(screen.getByLabelText("Heat marks"));
    fireEvent.click(screen.getByLabelText("Water"));
    expect(seen.value).toEqual(["heat-marks", "water"]);
    expect(screen.getByText("This stops the job.")).toBeTruthy();
    fireEvent.click(screen.getByLabelText("Sound"));
    expect(seen.value).toEqual(["sound"]);
  });

  it("offers the usual ratings and another one", () => {
    const seen = ask("supply.cutOutRatingA");
    fireEvent.click(screen.getByLabelText("100 A"));
    expect(seen.value).toBe(100);
    fireEvent.click(screen.getByLabelText("Other"));
    type(/another figure/, "63");
    expect(seen.value).toBe(63);
  });

  it("waits for every phase before it takes a demand", () => {
    const seen = ask("demand.existingA", { supply: { phases: 3 }, demand: { method: "measured" } });
    type("L1, amps", "20");
    expect(seen.held).not.toBeNull();
    type("L2, amps", "21");
    type("L3, amps", "22.5");
    expect(seen.value).toEqual([20, 21, 22.5]);
    expect(seen.held).toBeNull();
  });

  it("takes charging hours only with a start, an end and days", () => {
    const seen = ask("chargepoints[0].smartCharging.factoryDefault");
    fireEvent.click(screen.getByLabelText("Hours set"));
    type("From", "22:00");
    expect(seen.held).not.toBeNull();
    type("To", "08:00");
    expect(seen.value).toEqual([
      { days: ["mon", "tue", "wed", "thu", "fri", "sat", "sun"], from: "22:00", to: "08:00" },
    ]);
  });

  it("tells looked-and-none from not asked", () => {
    const seen = ask("demand.otherEquipment");
    fireEvent.click(screen.getByText("Looked, none"));
    expect(seen.value).toEqual([]);
  });

  it("does not send a line of a list before its first answer", () => {
    const seen = ask("supply.bonding");
    fireEvent.click(screen.getByText("Add a service"));
    expect(seen.held?.message).toBe("Service is needed for each line");
    type("Service", "gas");
    expect(seen.value).toEqual([{ service: "gas" }]);
  });

  it("puts today one tap away", () => {
    const seen = ask("dates.installed");
    fireEvent.click(screen.getByText(/^Today/));
    expect(seen.value).toBe("2026-12-01");
  });

  it("reads half hours from lines, and names the line it cannot read", () => {
    const seen = ask("demand.halfHourKwh", { demand: { method: "half-hourly" } });
    type(/Half-hourly readings/, "start,kwh\n2026-01-05T18:00:00Z, 3.2\n2026-01-05T18:30:00Z, 2.9");
    expect(seen.value).toEqual([
      { start: "2026-01-05T18:00:00Z", kwh: 3.2 },
      { start: "2026-01-05T18:30:00Z", kwh: 2.9 },
    ]);
    type(/Half-hourly readings/, "5 January, 3.2");
    expect(seen.held?.message).toContain("Line 1");
  });
});
