import type { Board, JobFacts } from "@/lib/notify/job";
import { knownNumber } from "@/lib/notify/job/facts";
import { statedLimitA } from "../demand/load-limit";
import { absent, circuitsOn } from "../facts";
import { cannotTell, met, metIf, notApplicable, notMet, rule, type Answer } from "../rule";

export const assemblyRule = rule({
  id: "supply.assembly-rating",
  group: "supply",
  title: "Overload of the board's assembly",
  reads: [
    "boards[].assemblyRatingA",
    "supply.cutOutRatingA",
    "circuits[].fedFrom",
    "circuits[].device.ratingA",
    "demand.loadLimit",
  ],
  sources: ["BS 7671 536.4.202"],
  gives: ["met", "not-met", "cannot-tell"],
});

export const waysRule = rule({
  id: "supply.board-ways",
  group: "supply",
  title: "Ways in the board",
  reads: ["boards[].ways", "boards[].modules", "boards[].arrangement"],
  sources: ["Common practice"],
  gives: ["met", "not-met", "cannot-tell", "not-applicable"],
});

type Upstream = { ratingA: number | null; name: string };

/** The device before a board: the distribution circuit that feeds all its circuits, else the service fuse. */
function upstreamOf(job: JobFacts, board: Board): Upstream {
  const feeds = new Set(circuitsOn(job, board).map(({ fedFrom }) => fedFrom));
  const [only] = feeds;
  const feeder = feeds.size === 1 ? job.circuits.find(({ id }) => id === only) : undefined;
  return feeder
    ? { ratingA: feeder.device.ratingA, name: `device of circuit ${feeder.id}` }
    : { ratingA: knownNumber(job.supply.cutOutRatingA), name: "service fuse" };
}

/** One of three: the device before it, loads that cannot exceed it, or a load limit with a tested fail-safe. */
export function assemblyAnswer(job: JobFacts, board: Board): Answer {
  const ratingA = knownNumber(board.assemblyRatingA);
  const upstream = upstreamOf(job, board);
  const devicesA = outgoingTotalA(job, board);
  const { failSafeTested } = job.demand.loadLimit;
  const limitA = statedLimitA(job);
  const used = { assemblyRatingA: ratingA, upstreamA: upstream.ratingA, outgoingA: devicesA, limitA, failSafeTested };
  if (ratingA === null) return cannotTell(`The rating of the assembly ${absent(board.assemblyRatingA)}.`, { used });
  const rest = { used, recorded: `${ratingA} A` };
  if (upstream.ratingA !== null && upstream.ratingA <= ratingA)
    return met(`The ${upstream.name} of ${upstream.ratingA} A is not above the assembly's ${ratingA} A.`, {
      ...rest,
      limit: `≥ ${upstream.ratingA} A`,
    });
  if (devicesA !== null && devicesA <= ratingA)
    return met(`All outgoing devices together are ${devicesA} A, so the loads cannot exceed ${ratingA} A.`, {
      ...rest,
      limit: `≥ ${devicesA} A`,
      workings: [
        `Outgoing devices: ${circuitsOn(job, board)
          .map(({ device }) => device.ratingA)
          .join(" + ")} = ${devicesA} A`,
      ],
    });
  if (limitA !== null && limitA <= ratingA) {
    if (failSafeTested === true)
      return met(
        `The load limit of ${limitA} A holds the assembly within ${ratingA} A, and its fail-safe was tested.`,
        {
          ...rest,
          limit: `≥ ${limitA} A`,
        },
      );
    return cannotTell(
      `A load limit of ${limitA} A stands before the assembly of ${ratingA} A; no agreed standard says how sure it must be, and no fail-safe test is recorded.`,
      rest,
    );
  }
  if (upstream.ratingA === null)
    return cannotTell(`The rating of the ${upstream.name} before the board is not known.`, rest);
  return notMet(
    `The ${upstream.name} of ${upstream.ratingA} A is above the assembly's ${ratingA} A, and nothing recorded holds the load below it.`,
    { ...rest, limit: `≥ ${upstream.ratingA} A` },
  );
}

/** Sum of the devices on an added board when all its circuits are recorded, amps; null otherwise. */
function outgoingTotalA(job: JobFacts, board: Board): number | null {
  const circuits = circuitsOn(job, board);
  const { circuitProtection, other } = board.modules;
  const whole = board.arrangement === "additional" && other === 0 && circuitProtection !== null;
  if (!whole || circuits.length === 0 || circuitProtection > 2 * circuits.length) return null;
  return circuits.reduce<number | null>(
    (sum, { device }) => (sum === null || device.ratingA === null ? null : sum + device.ratingA),
    0,
  );
}

/** Every module in the board against its ways. */
export function waysAnswer(board: Board): Answer {
  if (board.arrangement === "existing") return notApplicable("The board was there before; its ways are not judged.");
  if (board.arrangement === null) return cannotTell("Whether the board was added is not recorded.");
  const { mainSwitch, surgeProtection, circuitProtection, other } = board.modules;
  const counts = [mainSwitch, surgeProtection, circuitProtection, other].filter((count) => count !== null);
  const used = { ways: board.ways, mainSwitch, surgeProtection, circuitProtection, other };
  if (board.ways === null || counts.length < Object.keys(board.modules).length)
    return cannotTell("The ways of the board and the modules in it are needed.", { used });
  const needed = counts.reduce((sum, count) => sum + count, 0);
  return metIf(
    needed <= board.ways,
    needed <= board.ways
      ? `${needed} modules stand in ${board.ways} ways.`
      : `${needed} modules do not fit in ${board.ways} ways.`,
    {
      used,
      recorded: `${board.ways} ways`,
      limit: `≥ ${needed} modules`,
      workings: [
        `${counts.join(" + ")} = ${needed} modules`,
        "A surge device may need its own protective device, 1 or 2 modules; a double-pole device may take 2 (from memory: verify)",
      ],
    },
  );
}
