import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, describe, expect, it } from "vitest";
import { Thread, ThreadMini } from "@/components/thread/thread";
import type { ThreadView } from "@/lib/notify/views";

afterEach(cleanup);

const thread: ThreadView = [
  { name: "job", standing: "passed", state: "44 facts recorded", hash8: null },
  { name: "assessment", standing: "passed", state: "notify, nothing missing", hash8: null },
  { name: "pack", standing: "passed", state: "version 2, sealed", hash8: "a41f09c7" },
  { name: "submission", standing: "now", state: "nothing sent", hash8: null },
  { name: "review", standing: "ahead", state: "in the queue", hash8: null },
];

describe("the thread", () => {
  it("has five eyelets in order, each leading to its page, the open one marked", () => {
    render(<Thread jobId="j1" thread={thread} current="pack" />);
    const eyelets = within(screen.getByRole("list")).getAllByRole("listitem");
    expect(eyelets.map((each) => within(each).getByRole("link").getAttribute("href"))).toEqual([
      "/jobs/j1",
      "/jobs/j1/assessment",
      "/jobs/j1/pack",
      "/jobs/j1/submission",
      "/jobs/j1/review",
    ]);
    expect(eyelets.map((each) => each.getAttribute("aria-current"))).toEqual([null, null, "step", null, null]);
  });

  it("hangs a seal only where a pack is sealed", () => {
    const { container } = render(<Thread jobId="j1" thread={thread} />);
    expect(container.querySelectorAll(".thread__seal")).toHaveLength(1);
    cleanup();
    const unsealed = thread.map((eyelet) => ({ ...eyelet, hash8: null }));
    expect(render(<Thread jobId="j1" thread={unsealed} />).container.querySelector(".thread__seal")).toBeNull();
  });

  it("draws copper only as far as the present eyelet", () => {
    const { container } = render(<Thread jobId="j1" thread={thread} />);
    const wires = [...container.querySelectorAll(".thread__wire")];
    expect(wires.map((wire) => wire.classList.contains("thread__wire--ahead"))).toEqual([false, false, false, true]);
  });

  it("says the small one in words", () => {
    render(<ThreadMini thread={thread} />);
    expect(screen.getByRole("img", { name: "Job, Assessment, Pack passed; Submission now" })).toBeTruthy();
  });
});
