import type { Metadata } from "next";
import { Queue } from "@/components/review/queue";
import { ReviewSheet } from "@/components/review/review-sheet";
import { oneOf, wordOf } from "@/components/ui/query-link";
import { getReview, listReviews } from "@/db/queries/reviews";
import { may } from "@/lib/notify/permissions";
import { reviewStates } from "@/lib/notify/review";
import { requireViewer } from "@/lib/server/auth/viewer";
import { valueOf } from "../value-of";
import { approveAct, returnAct } from "./actions";

export const metadata: Metadata = { title: "Reviews" };

export default async function ReviewsPage({ searchParams }: PageProps<"/reviews">) {
  const viewer = await requireViewer();
  const asked = await searchParams;
  const state = wordOf(asked.state, reviewStates) ?? "waiting";
  const page = valueOf(await listReviews(viewer, { state, after: oneOf(asked.after) }));
  const first = page.rows[0] ? valueOf(await getReview(viewer, { reviewId: page.rows[0].id })) : null;
  const acts = may(viewer.roles, "reviews.decide") ? { approve: approveAct, giveBack: returnAct } : null;
  return (
    <main id="main" className="reviewing">
      <Queue page={page} state={state} openId={null} shownId={first?.id ?? null} />
      <div className="only-desk">
        {first ? (
          <ReviewSheet review={first} acts={acts} level={2} />
        ) : (
          <p className="none">Nothing here. A review begins when a pack is sealed.</p>
        )}
      </div>
    </main>
  );
}
