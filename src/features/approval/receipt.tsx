import { useEffect, useRef, type ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { formatUtcExact } from "@/components/quantity/format-time";
import { Digest } from "@/components/sign/sign-panel";
import { FactTable } from "@/components/table/table";
import { pages } from "@/contracts/paths";
import type { ReceiptView } from "@/contracts/views";

/**
 * What the record gives back: the entry's number, its time and its seal. Takes the focus, so that nobody misses it.
 *
 * title      "Signed and handed over"
 * children   what follows from it
 */
export function Receipt({
  title,
  receipt,
  screeningId,
  rev,
  children,
}: {
  title: string;
  receipt: ReceiptView;
  screeningId: string;
  rev: number;
  children: ReactNode;
}) {
  const head = useRef<HTMLHeadingElement>(null);
  useEffect(() => head.current?.focus(), []);
  return (
    <section aria-label="Receipt" role="status">
      <h2 ref={head} tabIndex={-1} className="mb-2">
        {title}
      </h2>
      <FactTable
        settled
        caption="Receipt"
        facts={[
          { label: "Entry", value: <b>{receipt.seq}</b> },
          { label: "Time", value: formatUtcExact(receipt.at) },
          { label: "Seal", value: <Digest hex={receipt.hash} /> },
          { label: "Content digest", value: <Digest hex={receipt.contentSha256} /> },
        ]}
      />
      <p className="py-3 font-serif text-prose text-ink-2">{children}</p>
      <div className="flex flex-wrap gap-3">
        <ButtonLink kind="main" href={pages.screening(screeningId, rev)}>
          Read the record
        </ButtonLink>
        <ButtonLink href={pages.entry(receipt.seq)}>Entry {receipt.seq}</ButtonLink>
      </div>
    </section>
  );
}
