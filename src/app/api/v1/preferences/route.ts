import { preferencesSchema } from "@/contracts/requests";
import { changePreferences } from "@/server/account/write";
import { defineRoute } from "@/server/door";
import { Answer } from "@/server/door-answer";

const aYearS = 365 * 24 * 3600;

/** Kept with the person, and in cookies that the next page is drawn from. */
export const PUT = defineRoute({
  act: "account.change",
  body: preferencesSchema,
  work: async (viewer, { body }) => {
    await changePreferences(viewer, body);
    const cookies = Object.entries(body).map(([name, value]): [string, string] => [
      "set-cookie",
      `${name}=${value}; Path=/; Max-Age=${aYearS}; SameSite=Lax`,
    ]);
    return new Answer(undefined, { headers: cookies });
  },
});
