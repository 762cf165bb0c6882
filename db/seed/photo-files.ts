import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { drawPhoto, isDrawn } from "./drawings";
import type { EvidenceSubject } from "@/lib/notify/job/papers";

/** Stand-ins kept as files, by the subject they show. */
const files: Partial<Record<EvidenceSubject, string>> = {
  intake: "intake.jpg",
  "cut-out": "cut-out.jpg",
  damage: "cut-out-heat.jpg",
  "default-hours-screen": "hours-screen-large.jpg",
  "delay-screen": "delay-screen.jpg",
  "first-use-prompt": "prompt-screen.jpg",
};

const made = new Map<string, Promise<Uint8Array>>();

/** The stand-in photo of a subject, read or drawn once a run. */
export function demoPhoto(subject: EvidenceSubject): Promise<Uint8Array> {
  const before = made.get(subject);
  if (before) return before;
  const file = files[subject];
  if (!file && !isDrawn(subject)) throw new Error(`the demo has no picture of ${subject}`);
  const photo = file
    ? readFile(join(import.meta.dirname, "photos", file)).then((bytes) => new Uint8Array(bytes))
    : drawPhoto(subject as Parameters<typeof drawPhoto>[0]);
  made.set(subject, photo);
  return photo;
}
