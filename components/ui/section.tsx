import type { ReactNode } from "react";

/** A part of a sheet: a heavy line above, its heading, and what stands at the right of the heading. */
export function Section({
  title,
  beside,
  id,
  children,
}: {
  title: string;
  beside?: ReactNode;
  id?: string;
  children: ReactNode;
}) {
  return (
    <section className="section" aria-labelledby={id ? `${id}-title` : undefined} id={id}>
      <div className="section__head">
        <h2 id={id ? `${id}-title` : undefined}>{title}</h2>
        {beside}
      </div>
      {children}
    </section>
  );
}
