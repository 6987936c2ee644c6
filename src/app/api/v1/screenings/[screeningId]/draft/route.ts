import { saveDraftSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { orNotFound } from "@/server/refusal";
import { saveDraft } from "@/server/screenings/draft";
import { getDraft } from "@/server/screenings/read";

export const GET = defineRoute({
  act: "draft.read",
  work: async (viewer, { params }) => orNotFound(await getDraft(viewer, params.screeningId ?? "")),
});

export const PUT = defineRoute({
  act: "draft.edit",
  body: saveDraftSchema,
  work: (viewer, { body, params }) => saveDraft(viewer, params.screeningId ?? "", body),
});
