import { setTimeout as wait } from "node:timers/promises";
import { expect, it, vi } from "vitest";

const seen = vi.hoisted(() => ({ now: 0, most: 0 }));

vi.mock("@node-rs/argon2", () => {
  const work = async () => {
    seen.now += 1;
    seen.most = Math.max(seen.most, seen.now);
    await wait(5);
    seen.now -= 1;
  };
  return {
    hash: async () => work().then(() => "hash"),
    verify: async (_: string, password: string) => {
      await work();
      if (password === "breaks") throw new Error("no memory");
      return true;
    },
  };
});

it("no more than two hashes run at once, and one that breaks gives up its turn (quality bar)", async () => {
  const { hashPassword, passwordMatches } = await import("@/lib/server/auth/passwords");
  const all = await Promise.allSettled([
    ...Array.from({ length: 6 }, () => hashPassword("x")),
    ...Array.from({ length: 3 }, () => passwordMatches("hash", "breaks")),
    ...Array.from({ length: 6 }, () => passwordMatches("hash", "x")),
  ]);
  expect(seen.most).toBe(2);
  expect(all.filter((one) => one.status === "rejected")).toHaveLength(3);
  expect(await passwordMatches("hash", "x")).toBe(true);
});
