"use client";

import { useRouter } from "next/navigation";
import { useEffect, useState } from "react";
import type { PackView } from "@/lib/notify/views";

const everyMs = 1000;
const patienceMs = 8000;

/** How far a version is built, asked for once a second until it is sealed or has failed. */
export function BuildProgress({ pack: atFirst }: { pack: PackView }) {
  const router = useRouter();
  const [pack, setPack] = useState(atFirst);
  const [isLost, setIsLost] = useState(false);
  const isBuilding = pack.status === "building";
  useEffect(() => {
    if (!isBuilding) return;
    const timer = setInterval(async () => {
      const next = await progressOf(atFirst.id);
      setIsLost(next === null);
      if (!next) return;
      setPack(next);
      if (next.status !== "building") router.refresh();
    }, everyMs);
    return () => clearInterval(timer);
  }, [atFirst.id, isBuilding, router]);
  if (pack.status === "failed")
    return (
      <div className="building building--failed" role="alert">
        <p>
          <b className="strong">Version {pack.version} could not be built.</b> {pack.error ?? ""} Nothing was lost: seal
          again to try once more.
        </p>
      </div>
    );
  if (pack.status === "sealed") return null;
  return (
    <div className="building" role="status">
      <p>
        <b className="strong">Version {pack.version} is being sealed.</b>{" "}
        {isLost ? "Waiting for the server." : `${pack.step}.`}
      </p>
      <progress max={100} value={pack.progress} aria-label={`Building version ${pack.version}`} />
    </div>
  );
}

async function progressOf(packId: string): Promise<PackView | null> {
  try {
    const response = await fetch(`/api/v1/packs/${packId}`, { signal: AbortSignal.timeout(patienceMs) });
    return response.ok ? ((await response.json()) as PackView) : null;
  } catch (error) {
    console.warn("The progress could not be read.", error);
    return null;
  }
}
