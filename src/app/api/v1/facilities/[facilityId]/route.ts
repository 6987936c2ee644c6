import { defineRoute } from "@/server/door";
import { getFacility } from "@/server/facilities/read";
import { orNotFound } from "@/server/refusal";

export const GET = defineRoute({
  act: "facility.read",
  work: async (viewer, { params }) => orNotFound(await getFacility(viewer, params.facilityId ?? "")),
});
