"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useEffect, useRef, useTransition, type ReactNode } from "react";
import { answersOf } from "./use-act";
import { withQuery, type Query } from "./query-link";

type Props = {
  path: string;
  label: string;
  /** Kept in the address beside the filters: the tab, the sort. */ keep: Query;
  count: string;
  children: ReactNode;
};

const typingMs = 350;

/** Filters that live in the address: a choice acts at once, typing after a short pause, Enter always. */
export function Filters({ path, label, keep, count, children }: Props) {
  const router = useRouter();
  const [pending, start] = useTransition();
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const go = (form: HTMLFormElement) => {
    clearTimeout(timer.current);
    start(() => router.replace(withQuery(path, keep, answersOf(form) as Query) as Route, { scroll: false }));
  };
  return (
    <form
      className="filters"
      role="search"
      aria-label={label}
      action={path}
      onSubmit={(event) => {
        event.preventDefault();
        go(event.currentTarget);
      }}
      onChange={(event) => {
        const form = event.currentTarget;
        clearTimeout(timer.current);
        const typed = event.target instanceof HTMLInputElement;
        timer.current = setTimeout(() => go(form), typed ? typingMs : 0);
      }}
    >
      {Object.entries(keep).map(([name, value]) =>
        value ? <input key={name} type="hidden" name={name} value={value} /> : null,
      )}
      {children}
      <button className="vh" type="submit">
        Filter
      </button>
      <span className="filters__count" role="status">
        {pending ? "Looking" : count}
      </span>
    </form>
  );
}
