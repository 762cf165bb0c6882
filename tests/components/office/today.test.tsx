import { cleanup, render, screen } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { dayGroups, jobInHand } from "@/components/today/day-groups";
import { InstallerDay } from "@/components/today/installer-day";
import type { JobRow } from "@/lib/notify/views";

afterEach(cleanup);

const today = "2026-12-01";
const job = (number: string, over: Partial<JobRow>): JobRow => ({
  id: number,
  number,
  stage: "installed",
  site: `${number} Bell Yard, Thrale`,
  postcode: null,
  operatorId: "15",
  operatorName: "Northern Powergrid",
  unit: "Kestrel Dock 7",
  route: "notify",
  standing: "recording",
  installerName: "Tam Orrell",
  installedOn: null,
  plannedOn: null,
  lastDay: null,
  missingCount: 0,
  version: 1,
  updatedAt: "2026-12-01T08:00:00Z",
  ...over,
});

const jobs = [
  job("A", { plannedOn: "2026-12-07", stage: "planned" }),
  job("B", { plannedOn: "2026-12-04", stage: "planned" }),
  job("C", { installedOn: "2026-11-30", lastDay: "2026-12-28" }),
  job("D", { installedOn: "2026-11-20", lastDay: "2026-12-02", missingCount: 2 }),
  job("E", { installedOn: today, standing: "sealing" }),
  job("F", { plannedOn: today, lastDay: "2026-12-29" }),
];

describe("the installer's day", () => {
  it("puts today first, then what is unfinished by its last day, then what is to come", () => {
    const { today: now, unfinished, coming } = dayGroups(jobs, today);
    expect([now, unfinished, coming].map((group) => group.map(({ number }) => number))).toEqual([
      ["E", "F"],
      ["D", "C"],
      ["B", "A"],
    ]);
  });
  it("goes on with today's first job that is not sealed, else with what is nearest its last day", () => {
    expect(jobInHand(dayGroups(jobs, today))?.number).toBe("F");
    expect(jobInHand(dayGroups(jobs.slice(0, 4), today))?.number).toBe("D");
    expect(jobInHand(dayGroups([], today))).toBeNull();
  });
  it("says what is missing and how long is left", () => {
    render(<InstallerDay groups={dayGroups(jobs, today)} returned={[]} today={today} />);
    expect(screen.getByText("2 facts missing")).toBeTruthy();
    expect(screen.getByText("1 day left, 2 Dec")).toBeTruthy();
  });
});
