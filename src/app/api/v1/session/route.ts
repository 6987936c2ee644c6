import { signInSchema } from "@/contracts/requests";
import { clearedCookie, sessionCookie } from "@/server/auth/cookie";
import { viewerView } from "@/server/auth/viewer";
import { defineOpenRoute, defineRoute } from "@/server/door";
import { Answer } from "@/server/door-answer";
import { signIn, signOut } from "@/server/session/write";

export const GET = defineRoute({
  act: "session.read",
  evenIfPasswordMustChange: true,
  work: async (viewer) => viewerView(viewer),
});

export const POST = defineOpenRoute({
  act: "session.open",
  body: signInSchema,
  work: async ({ body, request }) => {
    const { sealed, viewer } = await signIn(body, { userAgent: request.headers.get("user-agent") ?? "", network: null });
    return new Answer(viewerView(viewer), { headers: [["set-cookie", sessionCookie(sealed)]] });
  },
});

export const DELETE = defineRoute({
  act: "session.close",
  evenIfPasswordMustChange: true,
  work: async (viewer) => {
    await signOut(viewer);
    return new Answer(undefined, { headers: [["set-cookie", clearedCookie()]] });
  },
});
