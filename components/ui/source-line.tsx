import { sourceOf, type Source } from "@/lib/calc/sources";
import { longDate } from "./dates";

/** A source in full: title, clause, publisher, edition, and when it was last read. */
export function SourceLine({ reference }: { reference: string }) {
  const { source, clause } = sourceOf(reference);
  return (
    <>
      {source.title}
      {clause && `, ${clause}`}
      <span className="quiet">
        . {sentence(source.publisher)}
        {source.edition && `, ${source.edition}`}. {readInWords(source)}
      </span>
    </>
  );
}

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function readInWords({ seenOn, seen, publisher }: Source) {
  if (publisher === "Sealwire") return "";
  if (!seenOn || seen === "not seen") return "Not read: cited from memory.";
  return seen === "secondary" ? `Read as told by others, ${longDate(seenOn)}.` : `Read ${longDate(seenOn)}.`;
}
