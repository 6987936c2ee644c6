/**
 * The engine's own "no". A calculation that cannot be done ends in one of these, never in NaN and never in a guess.
 *
 * `path` is the place in the case document that caused it (`fluid.components[1].id`), where one field did.
 */
export type EngineErrorCode =
  | "invalid-case" // the document itself is wrong: unknown component, fractions that do not add up, a negative pressure
  | "outside-validity" // a published range was left; `details` names the bound
  | "no-convergence" // a bounded search ended without an answer; `details` holds the state and the iterations
  | "solid-phase" // the start is already solid
  | "not-applicable" // this equation cannot do this component or this quantity
  | "two-phase-start" // a one-phase method was given an input that splits into two phases
  | "cancelled";

export type EngineErrorDetails = Readonly<Record<string, number | string>>;
/** A place in the case document, and what is wrong there. */
export type PlacedProblem = { path: string; message: string };

export class EngineError extends Error {
  override readonly name = "EngineError";

  constructor(
    readonly code: EngineErrorCode,
    message: string,
    readonly details: EngineErrorDetails = {},
    readonly path?: string,
  ) {
    super(message);
  }

  /** Several faults of one document; the first speaks for all. */
  static invalid(problems: readonly PlacedProblem[]): EngineError {
    const error = new EngineError("invalid-case", problems[0]?.message ?? "The case is invalid.", {}, problems[0]?.path);
    error.others = problems.slice(1);
    return error;
  }

  private others: readonly PlacedProblem[] = [];

  /** Every fault told, at least one. */
  get problems(): PlacedProblem[] {
    return [{ path: this.path ?? "", message: this.message }, ...this.others];
  }

  /** The same refusal, pinned to a field of the case document. */
  at(path: string): EngineError {
    return new EngineError(this.code, this.message, this.details, path);
  }
}
