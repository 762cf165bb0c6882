"use client";

import type { DraftStore, DraftView } from "@/components/drafts/draft-store";
import { Button } from "@/components/ui/button";
import { answerText } from "./answer-text";
import { labelOf, placeOf } from "./questions/screens";

/** Two people changed the same fact: both values side by side, and nothing is lost until one is chosen. */
export function ConflictPanel({ draft }: { draft: DraftView & { store: DraftStore } }) {
  const { conflicts, changedBy, record, store } = draft;
  if (conflicts.length === 0) return null;
  const who = changedBy ?? "Somebody else";
  return (
    <section className="summary conflict" id="conflict" tabIndex={-1} aria-labelledby="conflict-title" role="alert">
      <h2 id="conflict-title">
        {who} changed {conflicts.length === 1 ? "the same fact" : `${conflicts.length} of the same facts`}
      </h2>
      <ul>
        {conflicts.map(({ path, yours, theirs }) => {
          const said = inWords(path, record);
          return (
            <li key={path}>
              <h3>{labelOf(path, record)}</h3>
              <dl>
                <div>
                  <dt>Yours</dt>
                  <dd>{said(yours)}</dd>
                </div>
                <div>
                  <dt>{who}</dt>
                  <dd>{said(theirs)}</dd>
                </div>
              </dl>
              <div className="choices choices--2">
                <Button onClick={() => store.choose(path, "yours")}>
                  Keep yours<span className="vh">: {labelOf(path, record)}</span>
                </Button>
                <Button onClick={() => store.choose(path, "theirs")}>
                  Take theirs<span className="vh">: {labelOf(path, record)}</span>
                </Button>
              </div>
            </li>
          );
        })}
      </ul>
    </section>
  );
}

/** The words of a value at a path; a whole list or object that no question shows is told by its size. */
function inWords(path: string, record: DraftView["record"]) {
  const place = placeOf(path, record);
  const question = place?.screen?.questions.find(({ at }) => at === path);
  return (value: unknown) => {
    if (question) return answerText(question, value);
    if (Array.isArray(value)) return `${value.length} in the list`;
    return value === null ? "Not recorded" : typeof value === "object" ? "Recorded" : String(value);
  };
}
