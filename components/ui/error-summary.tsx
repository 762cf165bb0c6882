"use client";

import { useEffect, useRef } from "react";
import type { FieldError } from "@/lib/notify/result";

type Props = {
  errors: readonly FieldError[];
  /** Turns a path into the id of its input; the path itself by default. */
  idOf?: (path: string) => string;
  /** Said in place of the count when the failure belongs to no field. */
  title?: string;
};

/**
 * What must be put right, in the same words as beside the fields. It takes focus whenever the errors change and puts
 * "Error: " before the page's title.
 */
export function ErrorSummary({ errors, idOf = (path) => path, title }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const said = errors.map(({ path, message }) => `${path} ${message}`).join("\n") + (title ?? "");
  useEffect(() => {
    if (!said) return;
    box.current?.focus();
    const before = document.title;
    if (!before.startsWith("Error: ")) document.title = `Error: ${before}`;
    return () => {
      document.title = before;
    };
  }, [said]);
  if (!said) return null;
  return (
    <div className="summary" ref={box} tabIndex={-1} role="alert" aria-labelledby="summary-title">
      <h2 id="summary-title">{title ?? thingsToPutRight(errors.length)}</h2>
      {errors.length > 0 && (
        <ul>
          {errors.map(({ path, message }) => (
            <li key={`${path} ${message}`}>
              <a href={`#${idOf(path)}`} onClick={(event) => focusOn(event, idOf(path))}>
                {message}
              </a>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}

const thingsToPutRight = (count: number) => `${count} ${count === 1 ? "thing" : "things"} to put right`;

function focusOn(event: React.MouseEvent, id: string) {
  const target = document.getElementById(id);
  if (!target) return;
  event.preventDefault();
  target.focus();
}
