import { defineOpenRoute } from "@/server/door";
import { Answer } from "@/server/door-answer";
import { readHealth } from "@/server/health/read";

/** For the start command and for a balancer: 200 once the database answers and is at this version, 503 until then. No details. */
export const GET = defineOpenRoute({
  act: "health.read",
  work: async () => {
    const health = await readHealth();
    return new Answer(health, { status: health.status === "ok" ? 200 : 503 });
  },
});
