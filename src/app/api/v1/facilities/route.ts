import { createFacilitySchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { listFacilities } from "@/server/facilities/read";
import { createFacility } from "@/server/facilities/write";

export const GET = defineRoute({ act: "facility.list", work: (viewer) => listFacilities(viewer) });

export const POST = defineRoute({
  act: "facility.create",
  body: createFacilitySchema,
  status: 201,
  work: (viewer, { body }) => createFacility(viewer, body),
});
