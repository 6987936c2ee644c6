import { changePersonSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { changePerson } from "@/server/people/write";

export const POST = defineRoute({
  act: "person.change",
  body: changePersonSchema,
  work: (viewer, { body, params }) => changePerson(viewer, params.personId ?? "", body),
});
