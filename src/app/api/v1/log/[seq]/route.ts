import { defineRoute } from "@/server/door";
import { getEntry } from "@/server/log/read";
import { orNotFound } from "@/server/refusal";

export const GET = defineRoute({
  act: "log.read",
  work: async (viewer, { params }) => orNotFound(await getEntry(viewer, Number(params.seq))),
});
