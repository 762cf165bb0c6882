import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { readFileSync } from "node:fs";
import { afterEach, describe, expect, it } from "vitest";
import { WeekSection } from "@/components/review/week-section";
import { assess } from "@/lib/notify/assess";
import { parseJob } from "@/lib/notify/job";

afterEach(cleanup);

// FEN-0139: hours 22:00 to 08:00 daily by a clock on UTC. In summer time that is 23:00 to 09:00 on the wall, and
// 08:00 to 09:00 on five weekdays lies in the peak hours of SI 2021/1467 reg 2: 5 x 60 = 300 minutes a week.
describe("the week of default hours", () => {
  const record: unknown = JSON.parse(readFileSync("tests/examples/fen-0139-clock-on-utc.json", "utf8"));
  const job = parseJob(record);
  if (!job.ok) throw new Error("the example does not parse");
  const [chargepoint] = job.value.chargepoints;
  const results = assess(job.value, "2026-12-01").smartCharging;

  it("opens on the season that is worse and says how many minutes", () => {
    render(<WeekSection chargepoint={chargepoint!} on="2026-12-01" results={results} />);
    expect(screen.getByText("300 minutes a week inside peak hours, in summer time.")).toBeTruthy();
    expect(screen.getByRole("button", { name: "Summer time" }).getAttribute("aria-pressed")).toBe("true");
    expect(screen.getByRole("status").textContent).toMatch(/08:00 to 09:00/);
  });
  it("shows the winter week without any of it", () => {
    render(<WeekSection chargepoint={chargepoint!} on="2026-12-01" results={results} />);
    fireEvent.click(screen.getByRole("button", { name: "Winter" }));
    expect(screen.getByRole("status").textContent).toMatch(/None of them is inside peak hours/);
  });
});
