import { logFilterSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { listLog } from "@/server/log/read";

export const GET = defineRoute({ act: "log.list", query: logFilterSchema, work: (viewer, { query }) => listLog(viewer, query) });
