import { describe, expect, it } from "vitest";
import { answerText, daysInWords, spacedSupplyNumber, standingOf } from "@/components/job/answer-text";
import { wordsOfError } from "@/components/job/fields/error-words";
import { firstRecord } from "@/components/job/open-job";
import { isWholePostcode, tidyPostcode } from "@/components/job/postcode";
import { groups } from "@/components/job/questions/screens";
import { refusalOf } from "@/components/photos/prepare-photo";
import { parseDraft } from "@/lib/notify/job";

const asked = (path: string) => {
  const question = Object.values(groups)
    .flatMap((list) => list.flatMap(({ questions }) => questions))
    .find((one) => one.path === path);
  if (!question) throw new Error(`nothing asks ${path}`);
  return question;
};

describe("answers in words", () => {
  it("tell not recorded from not known (job-record: three kinds of not having a fact)", () => {
    const looped = asked("supply.looped");
    expect(answerText(looped, null)).toBe("Not recorded");
    expect(answerText(looped, "unknown")).toBe("Not known");
    expect(answerText(looped, "no")).toBe("No");
    expect([standingOf(null), standingOf("unknown"), standingOf(0), standingOf(false), standingOf([])]).toEqual([
      "not-yet",
      "not-known",
      "answered",
      "answered",
      "answered",
    ]);
  });

  it("carry their units", () => {
    expect(answerText(asked("supply.externalLoopImpedanceOhm"), 0.21)).toBe("0.21 Ω");
    expect(answerText(asked("demand.existingA"), [24.8, 20])).toBe("24.8, 20 A");
    expect(answerText(asked("dates.installed"), "2026-12-01")).toBe("1 December 2026");
    expect(answerText(asked("supply.bonding"), [])).toBe("None");
  });

  it("say the days of charging hours", () => {
    expect(daysInWords(["mon", "tue", "wed", "thu", "fri", "sat", "sun"])).toBe("daily");
    expect(daysInWords(["mon", "tue", "wed", "thu", "fri"])).toBe("weekdays");
    expect(daysInWords(["sat", "sun"])).toBe("weekends");
    expect(daysInWords(["mon", "wed"])).toBe("Mon, Wed");
  });

  it("space a supply number as it is read aloud", () => {
    expect(spacedSupplyNumber("2399232323236")).toBe("23 9923 2323 236");
    expect(spacedSupplyNumber("not a number")).toBe("not a number");
  });
});

describe("messages at a field", () => {
  it("begin with the label and name the button", () => {
    expect(wordsOfError("Cut-out rating", 'must be at most 800 A; read it again or choose "unknown"')).toBe(
      "Cut-out rating must be at most 800 A; read it again or choose Not known",
    );
    expect(wordsOfError("Ze", 'must be a number in ohm without quotation marks, or "unknown"')).toBe(
      "Ze must be a number in ohm",
    );
    expect(wordsOfError("Ze", "Ze must be a number, such as 0.21")).toBe("Ze must be a number, such as 0.21");
    expect(wordsOfError("Installed on", "check the year: it must lie from 2000 to 2049")).toBe(
      "Installed on: check the year: it must lie from 2000 to 2049",
    );
    expect(wordsOfError("Ze", null)).toBeNull();
  });
});

describe("what is typed about the site", () => {
  it("prints a postcode in two parts, and leaves alone what is not one", () => {
    expect(tidyPostcode("xa34ef")).toBe("XA3 4EF");
    expect(tidyPostcode("XA3-4EF")).toBe("XA3 4EF");
    expect(tidyPostcode("SW1A")).toBe("SW1A");
    expect(isWholePostcode("xa3 4ef")).toBe(true);
    expect(isWholePostcode("XA3")).toBe(false);
  });

  it("says at the field that a supply number of twenty digits counts as missing (13 digits: MPAN core)", () => {
    const parsed = parseDraft({ format: "sealwire.job/1", jobNumber: "FEN-0001", stage: "installed" });
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
    const follows = (typed: string) => asked("site.supplyNumber").consequence?.(typed, parsed.value, 0);
    expect(follows("12345678901234567890")?.then).toContain("This has 20 characters.");
    expect(follows("23 9900 0001 521")).toBeNull();
  });
});

describe("a photo that cannot be taken", () => {
  it("is told by its kind, each with its own sentence", () => {
    const file = (name: string, type: string, size = 10) => refusalOf({ name, type, size });
    expect(file("a.jpg", "image/jpeg")).toBeNull();
    expect(file("a.jpg", "image/jpeg", 0)).toContain("empty");
    expect(file("a.heic", "")).toContain("HEIC");
    expect(file("a.pdf", "application/pdf")).toContain("not a photo");
    expect(file("a.svg", "image/svg+xml")).toContain("not a photo");
  });
});

describe("a new job", () => {
  it("begins with what was typed and nothing supposed", () => {
    const typed = {
      stage: "planned",
      day: "",
      customer: " ",
      phone: "",
      address: "4 Ropewalk Lane\n\nOxcombe",
      postcode: "XA3 4EF",
      supplyNumber: "",
      territory: "",
      premises: "",
    };
    const parsed = parseDraft({ format: "sealwire.job/1", jobNumber: "FEN-0001", ...firstRecord(typed) });
    if (!parsed.ok) throw new Error(JSON.stringify(parsed.fields));
    expect(parsed.value.site.address).toEqual(["4 Ropewalk Lane", "Oxcombe"]);
    expect(parsed.value.customer.name).toBeNull();
    expect(parsed.value.dates.installed).toBeNull();
    expect(parsed.value.chargepoints[0]?.ratedA).toBeNull();
  });
});
