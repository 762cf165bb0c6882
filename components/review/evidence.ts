import type { SmartChargingResult } from "@/lib/notify/assessment";
import type { PhotoView } from "@/lib/notify/views";

/** What a requirement was judged on: a photo of this job, a paper, or nothing. */
export type Evidence = { photo: PhotoView | null; number: number | null; grade: string | null; words: string };

const paperWords: Record<string, string> = {
  A: "Maker’s or seller’s statement",
  B: "Seen on the job",
  C: "Supporting paper only",
};

/** The evidence a rule read, with the photo's number among those of the job. */
export function evidenceOf({ used }: SmartChargingResult, photos: readonly PhotoView[]): Evidence {
  const grade = typeof used.grade === "string" ? used.grade : null;
  const index = photos.findIndex(({ file }) => file === used.photo);
  const photo = photos[index] ?? null;
  if (photo) return { photo, number: index + 1, grade, words: sentence(photo.caption ?? photo.subject) };
  return { photo, number: null, grade, words: (grade && paperWords[grade]) ?? "None" };
}

const sentence = (text: string) => {
  const words = text.replaceAll("-", " ");
  return words.charAt(0).toUpperCase() + words.slice(1);
};
