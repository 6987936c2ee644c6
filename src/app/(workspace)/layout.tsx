import { cookies } from "next/headers";
import type { ReactNode } from "react";
import { readTheme, themeCookie } from "@/components/theme/theme";
import { QueryProvider } from "@/features/query/query-provider";
import { WorkspaceStrip } from "@/features/session/workspace-strip";
import { requireViewer, viewerView } from "@/server/auth/viewer";

/** The strip around every page of a signed-in person. Each page asks for its viewer again: a layout is not drawn anew at every step. */
export default async function WorkspaceLayout({ children }: { children: ReactNode }) {
  const viewer = await requireViewer();
  const theme = readTheme((await cookies()).get(themeCookie)?.value);
  return (
    <QueryProvider>
      <WorkspaceStrip viewer={viewerView(viewer)} theme={theme} />
      {children}
    </QueryProvider>
  );
}
