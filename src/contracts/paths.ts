/** Every address inside the product. Pages, forms, mails and tests build addresses here, so links survive a move. */
import type { PartSlug } from "./lines/parts";

export const pages = {
  signIn: "/sign-in",
  /** Sign-in that leads on to a page of this site; to the desk without one. */
  signInThen: (address: string | null) => (address ? `/sign-in?next=${encodeURIComponent(address)}` : "/sign-in"),
  changePassword: "/change-password",
  desk: "/desk",
  account: "/account",
  facilities: "/facilities",
  facility: (facilityId: string) => `/facilities/${facilityId}`,
  sections: "/sections",
  section: (sectionId: string) => `/sections/${sectionId}`,
  screenings: "/screenings",
  newScreening: (sectionId?: string) => (sectionId ? `/screenings/new?section=${sectionId}` : "/screenings/new"),
  screening: (screeningId: string, rev?: number) => `/screenings/${screeningId}${rev ? `?rev=${rev}` : ""}`,
  /** A line of a case other than A opens that case; `letter` opens one without going to a line. */
  part: (screeningId: string, part: PartSlug, line?: string, letter: string | undefined = /^[A-Z]/.exec(line ?? "")?.[0]) =>
    `/screenings/${screeningId}/form/${part}${letter && letter !== "A" ? `?case=${letter}` : ""}${line ? `#line-${line}` : ""}`,
  /** Two computed cases or revisions side by side. */
  compare: (screeningId: string) => `/screenings/${screeningId}/compare`,
  /** The bores between too slow in the fire case and too cold in the cold one. */
  window: (screeningId: string, rev?: number) => `/screenings/${screeningId}/window${rev ? `?rev=${rev}` : ""}`,
  /** How sure the figures of a computed case are. */
  studies: (screeningId: string, rev?: number) => `/screenings/${screeningId}/studies${rev ? `?rev=${rev}` : ""}`,
  fluid: (screeningId: string, rev?: number) => `/screenings/${screeningId}/fluid${rev ? `?rev=${rev}` : ""}`,
  /** What is typed there stands in the fragment of the address. */
  changeOfState: "/change-of-state",
  sign: (screeningId: string) => `/screenings/${screeningId}/sign`,
  decide: (screeningId: string) => `/screenings/${screeningId}/decide`,
  log: "/log",
  entry: (seq: number) => `/log?entry=${seq}`,
  people: "/people",
} as const;

const api = "/api/v1";

export const endpoints = {
  health: `${api}/health`,
  session: `${api}/session`,
  oneSession: (sessionId: string) => `${api}/sessions/${sessionId}`,
  password: `${api}/password`,
  preferences: `${api}/preferences`,
  people: `${api}/people`,
  person: (personId: string) => `${api}/people/${personId}`,
  facilities: `${api}/facilities`,
  facility: (facilityId: string) => `${api}/facilities/${facilityId}`,
  members: (facilityId: string) => `${api}/facilities/${facilityId}/members`,
  sections: `${api}/sections`,
  section: (sectionId: string) => `${api}/sections/${sectionId}`,
  screenings: `${api}/screenings`,
  screening: (screeningId: string) => `${api}/screenings/${screeningId}`,
  draft: (screeningId: string) => `${api}/screenings/${screeningId}/draft`,
  compute: (screeningId: string) => `${api}/screenings/${screeningId}/compute`,
  ceremony: (screeningId: string) => `${api}/screenings/${screeningId}/ceremony`,
  sign: (screeningId: string) => `${api}/screenings/${screeningId}/sign`,
  countersign: (screeningId: string) => `${api}/screenings/${screeningId}/countersign`,
  giveBack: (screeningId: string) => `${api}/screenings/${screeningId}/return`,
  withdraw: (screeningId: string) => `${api}/screenings/${screeningId}/withdraw`,
  revisions: (screeningId: string) => `${api}/screenings/${screeningId}/revisions`,
  calculations: `${api}/calculations`,
  log: `${api}/log`,
  entry: (seq: number) => `${api}/log/${seq}`,
  verification: `${api}/log/verification`,
} as const;
