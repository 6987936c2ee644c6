import { defineRoute } from "@/server/door";
import { orNotFound } from "@/server/refusal";
import { listCautions } from "@/server/screenings/list-cautions";
import { getSection } from "@/server/sections/read";

export const GET = defineRoute({
  act: "section.read",
  work: async (viewer, { params }) => ({
    ...orNotFound(await getSection(viewer, params.sectionId ?? "")),
    cautions: listCautions,
  }),
});
