import type { Drawing } from "@/templates/drawings/svg";

/** A drawing of the documents on screen: the same one, with its alternative as the label. */
export function Picture({ drawing, caption }: { drawing: Drawing; caption: string }) {
  return (
    <figure>
      <div
        className="picture"
        role="img"
        aria-label={drawing.alt}
        tabIndex={0}
        dangerouslySetInnerHTML={{ __html: hiddenFromReaders(drawing.svg) }}
      />
      <figcaption className="chart-cap">{caption}</figcaption>
    </figure>
  );
}

/** The drawing carries its own words for paper; on screen the label above speaks for it. */
const hiddenFromReaders = (svg: string) => svg.replace("<svg ", '<svg aria-hidden="true" ');
