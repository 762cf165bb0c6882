import type { Route } from "next";
import { may, type Permission } from "@/lib/notify/permissions";
import type { Role } from "@/lib/notify/roles";
import type { Counts } from "@/lib/notify/views";

type Place = { href: Route; name: string; count?: keyof Counts; needs: Permission };

/** The contents list: the day's work first, then what the firm keeps. */
const dailyPlaces: readonly Place[] = [
  { href: "/", name: "Today", count: "today", needs: "jobs.read" },
  { href: "/jobs", name: "Jobs", count: "jobs", needs: "jobs.read" },
  { href: "/submissions", name: "Submissions", count: "submissions", needs: "submissions.read" },
  { href: "/reviews", name: "Reviews", count: "reviews", needs: "reviews.read" },
];
const keptPlaces: readonly Place[] = [
  { href: "/operators", name: "Operators", count: "operators", needs: "operators.read" },
  { href: "/rules", name: "Rules", needs: "jobs.read" },
  { href: "/team", name: "Team", count: "team", needs: "team.read" },
  { href: "/activity", name: "Activity", needs: "activity.read" },
];

/** Whether a page lies in a place: the place itself or anything below it. */
export const liesIn = (pathname: string, href: string) =>
  href === "/" ? pathname === "/" : pathname === href || pathname.startsWith(`${href}/`);

/** The two groups of the contents list, with only the places a person may see. */
export const placesFor = (roles: readonly Role[]) =>
  [dailyPlaces, keptPlaces].map((places) => places.filter(({ needs }) => may(roles, needs)));
