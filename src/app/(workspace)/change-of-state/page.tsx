import type { Metadata } from "next";
import { ChangePage } from "@/features/fluid/change/change-page";
import { requireViewer } from "@/server/auth/viewer";
import { NotForRole } from "../not-for-role";

export const metadata: Metadata = { title: "Change of state" };

/** Computed in the browser and stored nowhere; administrators have no part in calculations. */
export default async function ChangeOfStatePage() {
  const viewer = await requireViewer();
  if (viewer.role === "administrator")
    return <NotForRole viewer={viewer} what="Calculations" who={["engineer", "approver", "auditor"]} />;
  return <ChangePage store={`ebbmark-change-of-state/${viewer.badge}`} />;
}
