import Link from "next/link";
import { formatUtcExact } from "@/components/quantity/format-time";
import { Digest } from "@/components/sign/sign-panel";
import { pages } from "@/contracts/paths";
import { roleWords } from "@/contracts/roles";
import type { SignatureView } from "@/contracts/views";
import { LineLink } from "./line-link";

const heads = { signed: "Signed", countersigned: "Countersigned", returned: "Returned", withdrawn: "Withdrawn" } as const;

/**
 * Signatures under the revision in the words that are stored, each with its entry.
 *
 * edits   id of the screening whose form the lines of remarks lead to
 */
export function Signatures({ signatures, edits }: { signatures: readonly SignatureView[]; edits?: string }) {
  if (signatures.length === 0) return null;
  return (
    <section>
      <h2 className="mb-1">Signatures</h2>
      <ol className="border-t border-ink">
        {signatures.map((signature) => (
          <li key={signature.seq} className="unbroken border-b py-3 last:border-b-3 last:border-double last:border-ink">
            <p>
              <b>
                {heads[signature.act]} by {signature.printedName}
              </b>
              , {roleWords[signature.role]} {signature.badge}, {formatUtcExact(signature.at)}
            </p>
            <p className="max-w-[70ch] py-1 font-serif text-prose">“{signature.meaning}”</p>
            {signature.conditions.length > 0 && (
              <>
                <h3>Conditions</h3>
                <ol className="list-decimal pl-6 font-serif text-prose">
                  {signature.conditions.map((condition, index) => (
                    <li key={index}>{condition}</li>
                  ))}
                </ol>
              </>
            )}
            {signature.remarks.length > 0 && (
              <>
                <h3>Remarks</h3>
                <Remarks remarks={signature.remarks} {...(edits ? { edits } : {})} />
              </>
            )}
            <p className="text-small text-ink-3">
              <Link href={pages.entry(signature.seq)}>Entry {signature.seq}</Link>, {signature.method}, seal{" "}
              <Digest hex={signature.hash} short />
            </p>
          </li>
        ))}
      </ol>
    </section>
  );
}

/** Remarks, each tied to its line. */
export function Remarks({ remarks, edits }: { remarks: readonly { line: string; text: string; by: string }[]; edits?: string }) {
  return (
    <ul>
      {remarks.map(({ line, text, by }, index) => (
        <li key={index} className="grid grid-cols-[64px_minmax(0,1fr)] gap-2 border-t py-2 first:border-t-0">
          <LineLink line={line} {...(edits ? { edits } : {})} />
          <span className="font-serif text-prose">
            {text} <span className="font-num text-label text-ink-3">{by}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}
