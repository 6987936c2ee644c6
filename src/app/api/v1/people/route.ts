import { invitePersonSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { listPeople } from "@/server/people/read";
import { invitePerson } from "@/server/people/write";

export const GET = defineRoute({ act: "person.list", work: (viewer) => listPeople(viewer) });

export const POST = defineRoute({
  act: "person.enrol",
  body: invitePersonSchema,
  status: 201,
  work: (viewer, { body }) => invitePerson(viewer, body),
});
