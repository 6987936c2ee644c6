import { createSectionSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { listSections } from "@/server/sections/read";
import { createSection } from "@/server/sections/write";

export const GET = defineRoute({ act: "section.list", work: (viewer) => listSections(viewer) });

export const POST = defineRoute({
  act: "section.create",
  body: createSectionSchema,
  status: 201,
  work: (viewer, { body }) => createSection(viewer, body),
});
