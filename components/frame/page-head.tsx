import type { ReactNode } from "react";

/** The head of an office page: its name, a sentence on how things stand, and its acts at the right. */
export function PageHead({ title, say, children }: { title: string; say?: ReactNode; children?: ReactNode }) {
  return (
    <header className="page-head">
      <div>
        <h1>{title}</h1>
        {say && <p>{say}</p>}
      </div>
      {children && <div className="page-head__acts">{children}</div>}
    </header>
  );
}
