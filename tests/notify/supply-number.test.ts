import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkDigit, parseSupplyNumber } from "@/lib/notify/supply-number";

const cases: [string, "valid" | "refused", string][] = JSON.parse(
  readFileSync(new URL("../cases/network/supply-numbers.json", import.meta.url), "utf8"),
);

const core = fc.tuple(
  fc.constantFrom("10", "11", "12", "13", "14", "15", "16", "17", "18", "19", "20", "21", "22", "23"),
  fc.stringMatching(/^\d{10}$/),
);

describe("supply numbers", () => {
  // Made-up cores, checked by hand against the published weights (open-source library of 2023, MIT licence).
  for (const [number, verdict, why] of cases)
    it(`${number} is ${verdict}: ${why}`, () => {
      expect(parseSupplyNumber(number, "england").ok).toBe(verdict === "valid");
    });

  it("always says that the last two digits are not protected", () => {
    fc.assert(
      fc.property(core, ([distributor, unique]) => {
        const twelve = distributor + unique;
        const reading = parseSupplyNumber(`${twelve}${checkDigit(twelve)}`, "england");
        expect(reading.ok && reading.cautions[0]).toMatch(/last two digits/);
      }),
    );
  });

  it("reads the same core from every way of writing it", () => {
    const plain = parseSupplyNumber("2399232323236", "england");
    const ways = [
      "23 9923 2323 236",
      "23-9923-2323-236",
      "S 2399232323236",
      "s2399232323236",
      "23 9923\n2323 236",
      "00 801 100 23 9923 2323 236",
      "018011002399232323236",
      // 22 characters with a top line of 00: not read, and not taken for a business.
      "0000041AB2399232323236",
    ];
    for (const way of ways) expect(parseSupplyNumber(way, "england"), way).toEqual(plain);
    expect(plain.ok && plain.printed).toBe("23 9923 2323 236");
  });

  it("refuses other lengths, letters and gas numbers, each with its own remedy", () => {
    expect(parseSupplyNumber("239923232323", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/12 characters/),
    });
    expect(parseSupplyNumber("23992323232361", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/14 characters/),
    });
    expect(parseSupplyNumber("12345678901234567890", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/20 characters/),
    });
    expect(parseSupplyNumber("23992323232AB", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/digits/),
    });
    expect(parseSupplyNumber("1234567890", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/gas/),
    });
    expect(parseSupplyNumber("", "england").ok).toBe(false);
  });

  // NIE Networks: 11 digits from 81, one operator, no check digit.
  it("knows Northern Ireland from Great Britain", () => {
    expect(parseSupplyNumber("81 123 456 789", "northern-ireland")).toMatchObject({
      ok: true,
      kind: "mprn",
      operatorId: "ni",
      printed: "81 123 456 789",
    });
    expect(parseSupplyNumber("81123456789", "england")).toMatchObject({
      ok: false,
      message: expect.stringMatching(/Northern Ireland/),
    });
    expect(parseSupplyNumber("2399232323236", "northern-ireland").ok).toBe(false);
    expect(parseSupplyNumber("8112345678", "northern-ireland").ok).toBe(false);
  });

  it("warns of a distributor that the register does not know", () => {
    const reading = parseSupplyNumber("9900000000015", "england");
    expect(reading.ok && reading.cautions).toHaveLength(2);
  });

  // Computed on 5,000 random cores: single wrong digits pass at 1.7 %, because modulo 11 is taken modulo 10.
  it("catches most single wrong digits", () => {
    let passed = 0;
    let tried = 0;
    fc.assert(
      fc.property(core, fc.nat(12), fc.integer({ min: 1, max: 9 }), ([distributor, unique], at, shift) => {
        const twelve = distributor + unique;
        const digits = [...`${twelve}${checkDigit(twelve)}`];
        digits[at] = String((Number(digits[at]) + shift) % 10);
        tried += 1;
        if (checkDigit(digits.join("").slice(0, 12)) === Number(digits[12])) passed += 1;
      }),
      { numRuns: 4000, seed: 7 },
    );
    expect(passed / tried).toBeLessThan(0.04);
  });
});
