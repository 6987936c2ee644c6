import { signSchema } from "@/contracts/requests";
import { defineRoute } from "@/server/door";
import { signScreening } from "@/server/screenings/sign";

export const POST = defineRoute({
  act: "screening.sign",
  body: signSchema,
  work: (viewer, { body, params }) => signScreening(viewer, params.screeningId ?? "", body),
});
