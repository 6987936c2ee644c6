import { z } from "zod";
import { defineRoute } from "@/server/door";
import { calculate } from "@/server/calculations/run";

/** The case document is checked by the engine's own schema, which names every problem by its path. */
export const POST = defineRoute({
  act: "calculation.run",
  body: z.unknown(),
  work: (viewer, { body }) => calculate(viewer, body),
});
