import { verificationRangeSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { listVerification } from "@/server/log/read";

export const GET = defineRoute({
  act: "log.verify",
  query: verificationRangeSchema,
  work: (viewer, { query }) => listVerification(viewer, query),
});
