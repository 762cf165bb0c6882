import { daysBetween, longDate, shortDate, weekdayDate } from "@/components/ui/dates";
import type { Deadline } from "@/lib/notify/assessment";

const whatFor: Record<Deadline["what"], string> = {
  "demand-notice": "to notify",
  "completion-notice": "for the completion notice",
  "generation-notice": "for the generation notice",
  "building-control": "for building control",
};

type Props = { deadline: Deadline; from: string | null; today: string };

/** The last day as a number of days, with the days themselves as a strip. */
export function DaysLeft({ deadline, from, today }: Props) {
  const left = daysBetween(today, deadline.lastDay);
  const unit = Math.abs(left) === 1 ? "day" : "days";
  return (
    <section className="days" aria-label={`Last day ${whatFor[deadline.what]}`}>
      <span className={left < 0 ? "days__n is-late" : "days__n"}>{Math.abs(left)}</span>
      <p className="days__t">
        <b>
          {unit} {left < 0 ? "late" : "left"} {whatFor[deadline.what]}
        </b>
        Last day, {weekdayDate(deadline.lastDay)} {deadline.lastDay.slice(0, 4)}
        {deadline.safeBy !== deadline.lastDay && <>. Last working day before it, {longDate(deadline.safeBy)}</>}
      </p>
      {from && <Strip from={from} to={deadline.lastDay} today={today} />}
    </section>
  );
}

const width = 380;
const longestStrip = 60;

/** One tick a day; those passed are heavy, weekends short. */
function Strip({ from, to, today }: { from: string; to: string; today: string }) {
  const days = daysBetween(from, to);
  if (days < 1 || days > longestStrip) return null;
  const step = (width - 4) / days;
  const at = (day: number) => 2 + day * step;
  const passed = daysBetween(from, today);
  const shown = Math.min(Math.max(passed, 0), days);
  const isWeekend = (day: number) =>
    [0, 6].includes(new Date(Date.parse(`${from}T00:00:00Z`) + day * 86_400_000).getUTCDay());
  return (
    <svg
      className="days__strip chart"
      viewBox={`0 0 ${width} 40`}
      width={width}
      height="40"
      role="img"
      aria-label={`Day ${passed} of ${days}: from ${longDate(from)}, today ${longDate(today)}, last day ${longDate(to)}`}
    >
      {Array.from({ length: days + 1 }, (_, day) => (
        <path
          key={day}
          d={`M${at(day).toFixed(1)} ${day === 0 || day === days || day === passed ? 12 : isWeekend(day) ? 17 : 14}V22`}
          stroke={day <= passed || day === days ? "var(--color-ink)" : "var(--color-rule-strong)"}
          strokeWidth={day <= passed || day === days ? Math.min(4, step / 2) : 1.5}
        />
      ))}
      {shown > days * 0.16 && (
        <text x="0" y="36">
          {shortDate(from)}
        </text>
      )}
      <text
        className="k"
        x={at(shown)}
        y="36"
        textAnchor={shown > days * 0.9 ? "end" : shown < days * 0.1 ? "start" : "middle"}
      >
        today
      </text>
      {shown < days * 0.84 && (
        <text className="k" x={width} y="36" textAnchor="end">
          {shortDate(to)}
        </text>
      )}
      <circle cx={at(shown)} cy="6" r="3" fill="var(--color-ink)" />
    </svg>
  );
}
