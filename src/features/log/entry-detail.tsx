import Link from "next/link";
import { ChainPlace } from "@/components/log/log-table";
import { formatUtcExact } from "@/components/quantity/format-time";
import { Digest } from "@/components/sign/sign-panel";
import { FactTable } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import type { EntryView } from "@/contracts/views";
import { EntrySeal } from "./entry-seal";

type Props = {
  entry: EntryView;
  /** Screening the entry is about, where the viewer may open it. */
  screeningId: string | null;
  /** Addresses of the entries before and after, and of the list. */
  around: { before: string | null; after: string | null; list: string };
};

/** One entry: what happened in a sentence, what it says, where it stands in the chain, and its seal. */
export function EntryDetail({ entry, screeningId, around }: Props) {
  const { seq, at, by, what, record, rev, facts, body, bodySha256, hash, neighbours } = entry;
  return (
    <article aria-label={`Entry ${seq}`}>
      <nav aria-label="Entries around" className="mb-2 flex min-h-[34px] items-center justify-between gap-3 text-small">
        <Link href={around.list} className="hidden min-h-[44px] items-center phone:flex">
          All entries
        </Link>
        <span className="flex gap-4">
          {around.before && (
            <Link href={around.before} scroll={false} className="flex min-h-[34px] items-center phone:min-h-[44px]">
              Entry {neighbours.before?.seq}
            </Link>
          )}
          {around.after && (
            <Link href={around.after} scroll={false} className="flex min-h-[34px] items-center phone:min-h-[44px]">
              Entry {neighbours.after?.seq}
            </Link>
          )}
        </span>
      </nav>
      {/* Beside the list it is a part of the page; on a phone it is the page. */}
      <h2 className="phone:hidden">Entry {seq}</h2>
      <h1 className="hidden phone:block">Entry {seq}</h1>
      <p className="pb-3 font-serif text-prose">
        {by === "server" ? "The server" : by}: {lowerFirst(what)}
        {record && (
          <>
            {", "}
            {screeningId ? (
              <Link href={pages.screening(screeningId, rev ?? undefined)}>{`${record} rev ${rev}`}</Link>
            ) : (
              `${record} rev ${rev}`
            )}
          </>
        )}
        .
      </p>
      <FactTable
        caption={`What entry ${seq} says`}
        facts={[
          { label: "Time", value: `${formatUtcExact(at)}, server` },
          ...facts.map(({ label, value }) => ({
            label,
            value: /^[0-9a-f]{64}$/.test(value) ? (
              <Digest hex={value} />
            ) : (
              <span className="font-serif [overflow-wrap:anywhere]">{value}</span>
            ),
          })),
          { label: "Kind", value: <span className="font-cond">{entry.kind}</span> },
          { label: "Body digest", value: <Digest hex={bodySha256} /> },
        ]}
      />
      {body === null && <p className="pt-2 text-small text-ink-2">Its body is not open to your role.</p>}
      <h3 className="mb-1 mt-[18px]">Its place in the chain</h3>
      <ChainPlace
        links={[
          ...(neighbours.before ? [{ name: neighbours.before.seq, digest: shortSeal(neighbours.before.hash) }] : []),
          {
            name: seq,
            digest: shortSeal(hash),
            here: true,
            note:
              seq === 1
                ? "SHA-256 of its envelope, which starts from the origin"
                : `SHA-256 of its envelope, which holds the seal of entry ${seq - 1}`,
          },
          neighbours.after
            ? { name: neighbours.after.seq, digest: shortSeal(neighbours.after.hash) }
            : { name: "newest entry", digest: "" },
        ]}
      />
      <EntrySeal key={seq} seq={seq} />
      <details className="mt-3 text-small">
        <summary className="inline-flex min-h-[34px] cursor-pointer items-center text-tide underline underline-offset-[.2em] phone:min-h-[44px]">
          Stored text
        </summary>
        <h3 className="mt-1">Envelope</h3>
        <pre className="whitespace-pre-wrap font-cond text-label [overflow-wrap:anywhere]">{entry.envelope}</pre>
        {body !== null && (
          <>
            <h3 className="mt-2">Body</h3>
            <pre className="whitespace-pre-wrap font-cond text-label [overflow-wrap:anywhere]">{body}</pre>
          </>
        )}
      </details>
    </article>
  );
}

/** "77b0 … 12ce": enough to tell two apart by eye. */
const shortSeal = (hex: string): string => `${hex.slice(0, 4)} … ${hex.slice(-4)}`;
/** Sentences of the log start with a capital; badges and names stay as they are. */
const lowerFirst = (text: string): string => (/^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text);
