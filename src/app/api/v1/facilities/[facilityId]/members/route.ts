import { changeMembersSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { changeMembers } from "@/server/facilities/write";

export const POST = defineRoute({
  act: "member.change",
  body: changeMembersSchema,
  work: (viewer, { body, params }) => changeMembers(viewer, params.facilityId ?? "", body),
});
