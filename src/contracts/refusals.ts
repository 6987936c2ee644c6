/** The closed list of refusals a request can meet, with the sentence a person reads and the HTTP status. */
export const refusals = {
  "not-signed-in": { status: 401, title: "Sign in first. Your session has ended or was closed." },
  "wrong-credentials": { status: 401, title: "Badge or password is not right." },
  "account-locked": { status: 429, title: "Too many wrong passwords. Wait, then try again." },
  "account-disabled": { status: 403, title: "This account is disabled. An administrator can enable it again." },
  "must-change-password": { status: 403, title: "Choose your own password first." },
  "not-allowed": { status: 403, title: "Your role does not include this." },
  "not-found": { status: 404, title: "There is nothing at this address, or it is not open to you." },
  "invalid-request": { status: 422, title: "Some of what was sent can't be used. Each problem names its place." },
  "wrong-origin": { status: 403, title: "The request did not come from this site." },
  "too-large": { status: 413, title: "The request is larger than this address takes." },
  "unsupported-media-type": { status: 415, title: "Send JSON." },
  "draft-changed": { status: 409, title: "Someone, or another tab, saved this draft after you opened it." },
  "content-changed": { status: 412, title: "The record is no longer the one you were shown. Read it again before you sign." },
  "not-computed": { status: 409, title: "Compute in full first. The lines have changed since the last run." },
  "cannot-compute": { status: 422, title: "The case is complete, but it can't be computed." },
  "already-decided": { status: 409, title: "This revision has been decided already." },
  "own-work": { status: 403, title: "You had a hand in this revision, so another approver decides." },
  "wrong-state": { status: 409, title: "The revision is not in a state that allows this." },
  "ceremony-expired": { status: 410, title: "The signing page was open too long. Open it again." },
  "repeat-differs": { status: 409, title: "This act was already sent once with other content." },
  "already-exists": { status: 409, title: "There is one with this name already." },
  busy: { status: 503, title: "All calculation threads are busy. Try again in a moment." },
  "record-unavailable": { status: 503, title: "The record can't be written at the moment. Nothing was lost; try again." },
} as const;

export type RefusalCode = keyof typeof refusals;

/** What every refused request answers with (RFC 9457 problem details). */
export type Problem = {
  type: `urn:ebbmark:${string}`;
  title: string;
  status: number;
  detail?: string;
  requestId: string;
  problems?: { path: string; message: string }[];
  /** With "draft-changed": the draft as the other saved it. */
  current?: unknown;
};
