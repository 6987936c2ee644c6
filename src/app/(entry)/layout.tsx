import type { ReactNode } from "react";
import { QueryProvider } from "@/features/query/query-provider";

/** Pages before the workspace: no menu, because nothing is open yet. */
export default function EntryLayout({ children }: { children: ReactNode }) {
  return <QueryProvider>{children}</QueryProvider>;
}
