"use client";

import { useState } from "react";

type View = { name: string; svg: string; say: string };
type Props = { title: string; /** Of the heading. */ level: "h2" | "h3" | "h4"; views: View[]; worst: number };

/** The week against peak hours, winter or summer time: a unit that keeps UTC differs between the two. */
export function WeekView({ title, level: Heading, views, worst }: Props) {
  const [chosen, setChosen] = useState(worst);
  const view = views[chosen];
  if (!view) return null;
  return (
    <div>
      <div className="weekly__top">
        <Heading>{title}</Heading>
        <span className="either">
          {views.map(({ name }, index) => (
            <button key={name} type="button" aria-pressed={index === chosen} onClick={() => setChosen(index)}>
              {name}
            </button>
          ))}
        </span>
      </div>
      {/* Our own drawing, made on the server from times and numbers; it holds no text a person typed. */}
      <div className="chart week" dangerouslySetInnerHTML={{ __html: view.svg }} />
      <p className="vh" role="status">
        {view.say}
      </p>
    </div>
  );
}
