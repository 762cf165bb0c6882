import type { ComponentType } from "react";
import { cautionMark, outcomeWord } from "@/templates/drawings/marks";
import { factRows, signatureLines, type Laid } from "@/templates/layout";
import { Mark, TextView } from "./text-view";
import styles from "./document-view.module.css";

type Of<K extends Laid["kind"]> = Extract<Laid, { kind: K }>;

function Heading({ level, text }: Of<"heading">) {
  const Tag = ({ 1: "h2", 2: "h3", 3: "h4" } as const)[level];
  return <Tag>{text}</Tag>;
}

const Paragraph = ({ text }: Of<"paragraph">) => (
  <p>
    <TextView text={text} />
  </p>
);

function Facts({ rows, pairs = 1 }: Pick<Of<"facts">, "rows" | "pairs">) {
  return (
    <table className={`kv ${styles.facts} ${pairs === 2 ? "kv--2" : ""}`}>
      {pairs === 2 && (
        <colgroup>
          <col className={styles.label} />
          <col className={styles.value} />
          <col className={styles.label} />
          <col className={styles.value} />
        </colgroup>
      )}
      <tbody>
        {factRows(rows, pairs).map((facts, index) => (
          <tr key={index}>
            {facts.map(({ label, value }) => [
              <th key={label} scope="row">
                {label}
              </th>,
              <td key={`${label} value`} colSpan={pairs === 2 && facts.length === 1 ? 3 : undefined}>
                {value === "" ? <span className={styles.blank} /> : <TextView text={value} />}
              </td>,
            ])}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Table({ caption, columns, rows }: Of<"table">) {
  const className = (index: number) =>
    [columns[index]?.mono && "mono", columns[index]?.align === "right" && styles.right].filter(Boolean).join(" ") ||
    undefined;
  return (
    <table className={styles.table}>
      <caption>{caption}</caption>
      <colgroup>
        {columns.map(({ heading, widthPercent }) => (
          <col key={heading} width={`${widthPercent}%`} />
        ))}
      </colgroup>
      <thead>
        <tr>
          {columns.map(({ heading, align }) => (
            <th key={heading} scope="col" className={align === "right" ? styles.right : undefined}>
              {heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((cells, index) => (
          <tr key={index}>
            {cells.map((text, column) => (
              <td key={column} className={className(column)} data-heading={columns[column]?.heading}>
                <div>
                  <TextView text={text} />
                </div>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function List({ ordered, items }: Of<"list">) {
  const Tag = ordered ? "ol" : "ul";
  return (
    <Tag className={`${styles.list} ${ordered ? styles.steps : styles.points}`}>
      {items.map((item, index) => (
        <li key={index}>
          <TextView text={item} />
        </li>
      ))}
    </Tag>
  );
}

const Outcomes = ({ lines }: Of<"outcomes">) => (
  <div className={styles.outcomes}>
    {lines.map(({ outcome, title, because, sources }, index) => (
      <div key={index} className={styles.outcome}>
        <b className={styles.marked}>
          <Mark outcome={outcome} />
          {outcomeWord[outcome]}
        </b>
        <div>
          <p>
            <b>{title}</b>
          </p>
          <p>{because}</p>
          {sources.length > 0 && <p className={styles.source}>{sources.join("; ")}</p>}
        </div>
      </div>
    ))}
  </div>
);

const Workings = ({ title, lines }: Of<"workings">) => (
  <div className={styles.workings}>
    <p>{title}</p>
    {lines.map((line, index) => (
      <p key={index} className="mono">
        {line}
      </p>
    ))}
  </div>
);

const Caution = ({ title, text }: Of<"caution">) => (
  <div className="caution">
    <span className="caution__mark" aria-hidden dangerouslySetInnerHTML={{ __html: cautionMark }} />
    <p className="caution__text">
      <strong>{title}</strong>
      {text}
    </p>
  </div>
);

const Figure = ({ svg, caption }: Of<"figure">) => (
  <figure className={styles.figure}>
    {/* On a phone a drawing keeps a legible size and slides under the finger. */}
    <div
      className={styles.drawing}
      tabIndex={0}
      role="region"
      aria-label={caption}
      dangerouslySetInnerHTML={{ __html: svg }}
    />
    <figcaption>{caption}</figcaption>
  </figure>
);

const Signature = (block: Of<"signature">) => (
  <div className={styles.signature}>
    <p>{block.statement}</p>
    <Facts rows={signatureLines(block)} />
  </div>
);

/** One view for each kind of block; a kind without one is a failed build. */
const views: { [K in Laid["kind"]]: ComponentType<Of<K>> } = {
  heading: Heading,
  paragraph: Paragraph,
  facts: Facts,
  table: Table,
  list: List,
  outcomes: Outcomes,
  workings: Workings,
  caution: Caution,
  figure: Figure,
  signature: Signature,
};

/** One block on screen. @throws Error on a kind it does not know, so that nothing goes missing in silence. */
export function BlockView({ block }: { block: Laid }) {
  const View = views[block.kind] as ComponentType<Laid> | undefined;
  if (!View) throw new Error(`No view for a block of kind "${(block as { kind: string }).kind}".`);
  return <View {...block} />;
}
