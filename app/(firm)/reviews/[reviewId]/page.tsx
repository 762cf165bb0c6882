import type { Metadata, Route } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { Queue } from "@/components/review/queue";
import { ReviewSheet } from "@/components/review/review-sheet";
import { BackIcon } from "@/components/ui/icons";
import { idOf, withQuery, wordOf } from "@/components/ui/query-link";
import { getReview, listReviews } from "@/db/queries/reviews";
import { may } from "@/lib/notify/permissions";
import { reviewStates } from "@/lib/notify/review";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../../value-of";
import { approveAct, returnAct } from "../actions";

export const metadata: Metadata = { title: "Settings review" };

export default async function ReviewPage({ params, searchParams }: PageProps<"/reviews/[reviewId]">) {
  const viewer = await requireViewer();
  const reviewId = idOf((await params).reviewId);
  if (!reviewId) notFound();
  const state = wordOf((await searchParams).state, reviewStates) ?? "waiting";
  const [review, page] = await Promise.all([
    getReview(viewer, { reviewId }),
    listReviews(viewer, { state, after: null }),
  ]);
  const acts = may(viewer.roles, "reviews.decide") ? { approve: approveAct, giveBack: returnAct } : null;
  return (
    <main id="main" className="reviewing reviewing--open">
      <Link className="only-site reviewing__back" href={withQuery("/reviews", { state }) as Route}>
        <BackIcon /> All reviews
      </Link>
      <Queue page={valueOf(page)} state={state} openId={reviewId} />
      <ReviewSheet review={valueOf(review)} acts={acts} />
    </main>
  );
}
