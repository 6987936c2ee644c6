import type { Envelope } from "./envelope";

export type FoldedPerson = { badge: string; role: string; active: boolean };
export type FoldedRevision = {
  state: string;
  author: string;
  contributors: string[];
  contentSha256: string;
  decidedBy: string | null;
};
export type Fold = {
  persons: Map<string, FoldedPerson>;
  /** Keyed "facility person". */
  members: Set<string>;
  /** Keyed by subject, "screening:…:rev". */
  revisions: Map<string, FoldedRevision>;
  /** The newest open proposal for a person, keyed by the person. */
  proposals: Map<string, { seq: number; role: string; by: string }>;
};

type Body = Record<string, unknown>;
type Step = (fold: Fold, envelope: Envelope, body: Body) => string[];

/**
 * Replays what the entries say happened to people, memberships and revisions, and names every step the rules did not allow: an author who
 * countersigned, a person who was disabled, a state that could not follow. It needs nothing of the database, so it also convicts a record
 * that was rewritten and chained anew.
 *
 * It needs every body. `push` answers undefined for an entry whose part in the story can't be read; from there on the story is not known.
 */
export function createFold() {
  const state: Fold = { persons: new Map(), members: new Set(), revisions: new Map(), proposals: new Map() };
  const push = (envelope: Envelope, body: Body | undefined): string[] | undefined => {
    const step = Object.hasOwn(steps, envelope.kind) ? steps[envelope.kind] : undefined;
    if (!step) return [];
    return body && step(state, envelope, body);
  };
  return { state, push };
}

const steps: Record<string, Step> = {
  genesis: (_fold, { seq }) => (seq === 1 ? [] : ["A record is founded once, by its first entry."]),

  person_enrolled: (fold, { actor, subject }, body) => {
    const faults =
      actor === "system"
        ? fold.persons.size === 0
          ? []
          : ["Only the first person is enrolled by the installation."]
        : actorFaults(fold, actor, ["administrator"]);
    const id = idOf(subject);
    if (fold.persons.has(id)) faults.push("This person was enrolled before.");
    fold.persons.set(id, { badge: text(body.badge), role: text(body.role), active: true });
    return faults;
  },
  person_disabled: (fold, envelope) => changePerson(fold, envelope, (person) => (person.active = false)),
  person_reenabled: (fold, envelope) => changePerson(fold, envelope, (person) => (person.active = true)),
  role_proposed: (fold, envelope, body) => {
    const faults = [...changePerson(fold, envelope, () => undefined), ...ruleFaults(fold, body)];
    fold.proposals.set(idOf(envelope.subject), { seq: envelope.seq, role: text(body.role), by: envelope.actor });
    return faults;
  },
  role_confirmed: (fold, envelope, body) => {
    const faults = ruleFaults(fold, body);
    const proposal = fold.proposals.get(idOf(envelope.subject));
    if (!proposal || proposal.seq !== body.proposed || proposal.role !== body.role)
      faults.push("No entry proposed this change of role.");
    else if (twoPersonRule(fold) === "bound" && proposal.by === envelope.actor)
      faults.push("The change of role was confirmed by who proposed it.");
    fold.proposals.delete(idOf(envelope.subject));
    return [...faults, ...changePerson(fold, envelope, (person) => (person.role = text(body.role)))];
  },

  member_added: (fold, { actor, subject }) => {
    fold.members.add(memberKey(subject));
    return actorFaults(fold, actor, ["administrator"]);
  },
  member_removed: (fold, { actor, subject }) => {
    const faults = actorFaults(fold, actor, ["administrator"]);
    if (!fold.members.delete(memberKey(subject))) faults.push("This membership did not exist.");
    return faults;
  },

  screening_signed: (fold, { actor, subject }, body) => {
    const faults = [...actorFaults(fold, actor, ["engineer"]), ...signerFaults(actor, subject, body)];
    if (fold.revisions.has(subject)) faults.push("This revision was signed before.");
    const contributors = Array.isArray(body.contributors) ? body.contributors.map(text) : [];
    if (!contributors.includes(actor)) faults.push("The signer is not among the contributors.");
    fold.revisions.set(subject, {
      state: "signed",
      author: actor,
      contributors,
      contentSha256: contentOf(body),
      decidedBy: null,
    });
    return faults;
  },
  screening_countersigned: (fold, envelope, body) => decide(fold, envelope, body, "countersigned"),
  screening_returned: (fold, envelope, body) => decide(fold, envelope, body, "returned"),
  screening_superseded: (fold, { subject }) => close(fold, subject, "superseded", ["signed", "countersigned", "returned"]),
  screening_withdrawn: (fold, { actor, subject }, body) => [
    ...actorFaults(fold, actor, ["engineer", "approver"]),
    ...signerFaults(actor, subject, body),
    ...close(fold, subject, "withdrawn", ["signed", "countersigned"]),
  ],
};

function decide(fold: Fold, { actor, subject }: Envelope, body: Body, state: string): string[] {
  const faults = [...actorFaults(fold, actor, ["approver"]), ...signerFaults(actor, subject, body)];
  const revision = fold.revisions.get(subject);
  if (!revision) return [...faults, "This revision was never signed."];
  if (revision.state !== "signed") faults.push(`A revision that is ${revision.state} can't be ${state}.`);
  if (revision.author === actor || revision.contributors.includes(actor))
    faults.push(`It was ${state} by somebody who had a hand in it.`);
  if (revision.contentSha256 !== contentOf(body)) faults.push("The decision names other content than was signed.");
  revision.state = state;
  revision.decidedBy = actor;
  return faults;
}

function close(fold: Fold, subject: string, state: string, from: string[]): string[] {
  const revision = fold.revisions.get(subject);
  if (!revision) return ["This revision was never signed."];
  const faults = from.includes(revision.state) ? [] : [`A revision that is ${revision.state} can't be ${state}.`];
  revision.state = state;
  return faults;
}

function changePerson(fold: Fold, { actor, subject }: Envelope, change: (person: FoldedPerson) => void): string[] {
  const faults = actorFaults(fold, actor, ["administrator"]);
  const id = idOf(subject);
  if (id === actor) faults.push("Nobody changes their own account or role.");
  const person = fold.persons.get(id);
  if (!person) return [...faults, "This person was never enrolled."];
  change(person);
  return faults;
}

function actorFaults({ persons }: Fold, actor: string, roles: string[]): string[] {
  const person = persons.get(actor);
  if (!person) return ["The person acting was never enrolled."];
  if (!person.active) return [`${person.badge} was disabled at that time.`];
  return roles.includes(person.role)
    ? []
    : [`${person.badge} was ${person.role} at that time; this takes ${roles.join(" or ")}.`];
}

/** The statement must be the actor's own and about the subject: a signature can't be moved to another person or record. */
function signerFaults(actor: string, subject: string, body: Body): string[] {
  const faults: string[] = [];
  if (member(body.person, "id") !== actor) faults.push("The statement is another person's than the actor's.");
  const { screening } = body;
  if (`screening:${text(member(screening, "id"))}:${text(member(screening, "rev"))}` !== subject) {
    faults.push("The statement is about another revision than the subject.");
  }
  return faults;
}

function twoPersonRule({ persons }: Fold): "bound" | "not yet bound: one administrator" {
  const administrators = [...persons.values()].filter(({ role, active }) => role === "administrator" && active).length;
  return administrators >= 2 ? "bound" : "not yet bound: one administrator";
}

function ruleFaults(fold: Fold, body: Body): string[] {
  const rule = twoPersonRule(fold);
  return body.twoPersonRule === rule ? [] : [`The two-person rule was ${rule} then; the entry says otherwise.`];
}

const text = (value: unknown): string => (typeof value === "string" || typeof value === "number" ? String(value) : "");
const member = (value: unknown, key: string): unknown =>
  value !== null && typeof value === "object" && Object.hasOwn(value, key) ? (value as Body)[key] : undefined;
const contentOf = (body: Body): string => text(member(body.content, "sha256"));
const idOf = (subject: string): string => subject.split(":")[1] ?? "";
const memberKey = (subject: string): string => subject.split(":").slice(1).join(" ");
