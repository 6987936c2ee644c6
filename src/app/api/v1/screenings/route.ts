import { createScreeningSchema, screeningFilterSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { createScreening } from "@/server/screenings/create";
import { listCautions } from "@/server/screenings/list-cautions";
import { listScreenings } from "@/server/screenings/list";

export const GET = defineRoute({
  act: "screening.list",
  query: screeningFilterSchema,
  work: async (viewer, { query }) => ({ ...(await listScreenings(viewer, query)), cautions: listCautions }),
});

export const POST = defineRoute({
  act: "screening.create",
  body: createScreeningSchema,
  status: 201,
  work: (viewer, { body }) => createScreening(viewer, body),
});
