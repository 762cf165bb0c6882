import { headerWire } from "@/templates/drawings/marks";
import { laidOut, runningFoot, runningHead } from "@/templates/layout";
import type { DocumentModel } from "@/templates/model";
import { printableModel } from "@/templates/printable";
import { BlockView } from "./block-view";
import styles from "./document-view.module.css";

/**
 * A document on screen, as it will print: the words, order and figures of the Word file, on one long sheet.
 * Holds no state, so it renders on the server and in the browser.
 */
export function DocumentView({ document }: { document: DocumentModel }) {
  const model = printableModel(document);
  return (
    <article className={`a4 ${styles.sheet}`} lang="en-GB" aria-label={model.title}>
      <header className="a4__head">
        <span aria-hidden dangerouslySetInnerHTML={{ __html: headerWire }} />
        <b>{model.firmName}</b>
        <span>{runningHead(model)}</span>
      </header>
      <h1>{model.title}</h1>
      <p className="a4__sub">{model.subtitle}</p>
      {laidOut(model.blocks).map((block, index) => (
        <BlockView key={index} block={block} />
      ))}
      <footer className={styles.foot}>
        <div className="a4__foot">
          <span>{runningFoot(model)}</span>
        </div>
      </footer>
    </article>
  );
}
