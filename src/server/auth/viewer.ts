import "server-only";
import { pages } from "@/contracts/paths";
import type { Role } from "@/contracts/roles";
import type { ViewerView } from "@/contracts/views";
import { env } from "@/server/env";
import { Refusal } from "@/server/refusal";
import { addressHeader } from "./address-header";
import { cookieName } from "./cookie";
import { loadSession, type LoadedSession } from "./session";

const made: unique symbol = Symbol("viewer");

/**
 * Who asks. Only this file can make one, so a function that takes a `Viewer` knows that somebody signed in (or that a named job runs).
 * It says who, not whether: every read and write asks `authorise` first.
 */
export type Viewer = {
  readonly id: string;
  readonly badge: string;
  readonly printedName: string;
  readonly role: Role | "system";
  readonly active: boolean;
  readonly mustChangePassword: boolean;
  readonly units: "SI" | "US";
  readonly theme: "light" | "dark" | "system" | null;
  readonly facilityIds: ReadonlySet<string>;
  /** SHA-256 of the session id; null for a job. */
  readonly sessionId: string | null;
  readonly [made]: true;
};

const fromSession = (loaded: LoadedSession): Viewer => ({ ...loaded, [made]: true });

/** The viewer behind a sealed cookie, or null. Role, membership and the active flag come from the database each time. */
export async function viewerFromCookie(sealed: string | undefined): Promise<Viewer | null> {
  const loaded = await loadSession(sealed);
  return loaded && fromSession(loaded);
}

// Next.js is loaded where a page asks for it: jobs and tests use this file too, and have no page.

/** For pages that also serve strangers. */
export async function currentViewer(): Promise<Viewer | null> {
  const { cookies } = await import("next/headers");
  return viewerFromCookie((await cookies()).get(cookieName())?.value);
}

/** For pages. Sends strangers to the sign-in page, which leads back here, and people with a first password to the page that changes it. */
export async function requireViewer(options: { evenIfPasswordMustChange?: true } = {}): Promise<Viewer> {
  const viewer = await currentViewer();
  const { redirect } = await import("next/navigation");
  if (!viewer) {
    const { headers } = await import("next/headers");
    return redirect(pages.signInThen((await headers()).get(addressHeader)));
  }
  if (viewer.mustChangePassword && !options.evenIfPasswordMustChange) return redirect(pages.changePassword);
  return viewer;
}

/** A job that acts for nobody. The matrix lists the little it may do. */
export function systemViewer(job: "seed"): Viewer {
  return {
    id: "system",
    badge: "system",
    printedName: job,
    role: "system",
    active: true,
    mustChangePassword: false,
    units: "SI",
    theme: null,
    facilityIds: new Set(),
    sessionId: null,
    [made]: true,
  };
}

/** What the browser may know of the person. */
export function viewerView(viewer: Viewer): ViewerView {
  if (viewer.role === "system") throw new Refusal("not-signed-in");
  const { id, badge, printedName, role, active, mustChangePassword, units, theme } = viewer;
  return { id, badge, printedName, role, active, mustChangePassword, units, theme, demo: env().demo };
}
