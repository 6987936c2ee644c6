import type { Problem, RefusalCode } from "@/contracts/refusals";

/** The server understood the request and said no, for a reason out of the closed list; "unexpected" is a fault of its own. */
export class RefusedError extends Error {
  override readonly name = "RefusedError";
  readonly code: RefusalCode | "unexpected";

  constructor(readonly problem: Problem) {
    super(problem.detail ?? problem.title);
    // Every problem of this site is named by a code of the list, or by "unexpected".
    this.code = problem.type.slice("urn:ebbmark:".length) as RefusalCode | "unexpected";
  }

  /** What is wrong with one field of what was sent. */
  problemAt(path: string): string | undefined {
    return this.problem.problems?.find((one) => one.path === path)?.message;
  }
}

/** No answer came: it is not known whether the request arrived. Sending the same again is what to do. */
export class UnreachableError extends Error {
  override readonly name = "UnreachableError";

  constructor(options?: ErrorOptions) {
    super("The connection was lost before an answer came.", options);
  }
}

export const isRefused = (error: unknown, code?: RefusalCode): error is RefusedError =>
  error instanceof RefusedError && (code === undefined || error.code === code);

/** What to tell the person: the refusal's title and its detail, or that no answer came. */
export function wordsOf(error: unknown): string {
  if (error instanceof RefusedError) {
    const { title, detail } = error.problem;
    return detail && detail !== title ? `${title} ${detail}` : title;
  }
  return error instanceof UnreachableError
    ? error.message
    : "Something went wrong in this page. Load it again; nothing was changed.";
}
