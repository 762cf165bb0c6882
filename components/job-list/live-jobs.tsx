"use client";

import { QueryClient, QueryClientProvider, useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { withQuery, type Query } from "@/components/ui/query-link";
import type { JobFilter, JobRow, Page } from "@/lib/notify/views";
import { JobTable } from "./job-table";

type Props = { first: Page<JobRow>; today: string; sort: JobFilter["sort"]; query: Query; after: string | null };

const everyMs = 20_000;

/** The list as the server drew it, then read again every 20 seconds and whenever the window is looked at. */
export function LiveJobs(props: Props) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Rows {...props} />
    </QueryClientProvider>
  );
}

function Rows({ first, today, sort, query, after }: Props) {
  const address = withQuery("/api/v1/jobs", query, { sort, after });
  const { data, isError, dataUpdatedAt } = useQuery({
    queryKey: [address],
    queryFn: ({ signal }) => readJobs(address, signal),
    initialData: first,
    refetchInterval: everyMs,
    staleTime: everyMs,
  });
  return (
    <>
      <JobTable rows={data.rows} today={today} sort={sort} query={query} />
      {isError && (
        <p className="none" role="status">
          The list could not be read again; it stands as at {new Date(dataUpdatedAt).toLocaleTimeString("en-GB")}.
        </p>
      )}
    </>
  );
}

async function readJobs(address: string, signal: AbortSignal): Promise<Page<JobRow>> {
  const answer = await fetch(address, { signal, headers: { accept: "application/json" } });
  if (!answer.ok) throw new Error(`jobs: ${answer.status}`);
  return (await answer.json()) as Page<JobRow>;
}
