import { EngineError } from "../errors";

/** The value, or undefined where the engine says no: one attempt of several. */
export function attempted<Value>(attempt: () => Value): Value | undefined {
  try {
    return attempt();
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}
