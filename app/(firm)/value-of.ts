import { notFound } from "next/navigation";
import type { Result } from "@/lib/notify/result";

/**
 * The value of a query, for a page. A miss, and what the person may not see, become the not-found page; any other
 * failure becomes the error page.
 */
export function valueOf<T>(result: Result<T>): T {
  if (result.ok) return result.value;
  if (result.error.code === "not-found" || result.error.code === "forbidden") notFound();
  throw new Error(`${result.error.code}: ${result.error.message}`);
}
