import type { Route } from "next";
import Link from "next/link";
import type { ReactNode } from "react";
import { BackIcon } from "@/components/ui/icons";

/** The phone's bar on a job: one way back, the number, and how saving stands. */
export function JobBar({
  number,
  back,
  backTo,
  children,
}: {
  number: string;
  back: string;
  backTo: string;
  children?: ReactNode;
}) {
  return (
    <header className="site__bar">
      <Link className="site__back" href={back as Route} aria-label={`Back to ${backTo}`}>
        <BackIcon />
      </Link>
      <span className="mono">{number}</span>
      {children}
    </header>
  );
}
