"use client";

import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import { RefusedError } from "./refused-error";

/** One store of what was fetched. A refusal is an answer and is never asked for again; a lost connection is tried twice more when reading. */
export function QueryProvider({ children }: { children: ReactNode }) {
  const [client] = useState(
    () =>
      new QueryClient({
        defaultOptions: {
          queries: {
            staleTime: 30_000,
            refetchOnWindowFocus: false,
            retry: (failures, error) => !(error instanceof RefusedError) && failures < 2,
          },
          // A change is never repeated on its own; `always` lets it fail at once without a network, so that the page can say so.
          mutations: { retry: false, networkMode: "always" },
        },
      }),
  );
  return <QueryClientProvider client={client}>{children}</QueryClientProvider>;
}
