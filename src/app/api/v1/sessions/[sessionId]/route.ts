import { endOwnSession } from "@/server/account/write";
import { defineRoute } from "@/server/door";

export const DELETE = defineRoute({
  act: "account.change",
  work: (viewer, { params }) => endOwnSession(viewer, params.sessionId ?? ""),
});
