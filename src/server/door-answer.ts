import "server-only";

/** What a route's work returns when a plain JSON value is not enough: another status, or headers such as a cookie. */
export class Answer {
  constructor(
    private readonly body: unknown,
    private readonly options: { status?: number; headers?: [string, string][] } = {},
  ) {}

  toResponse(): Response {
    const headers = new Headers();
    for (const [name, value] of this.options.headers ?? []) headers.append(name, value);
    if (this.body === undefined) return new Response(null, { status: this.options.status ?? 204, headers });
    return Response.json(this.body, { status: this.options.status ?? 200, headers });
  }
}
