import { changePasswordSchema } from "@/contracts/requests";
import { changePassword } from "@/server/account/write";
import { defineRoute } from "@/server/door";

export const POST = defineRoute({
  act: "account.change",
  evenIfPasswordMustChange: true,
  body: changePasswordSchema,
  work: (viewer, { body }) => changePassword(viewer, body),
});
