import type { ReactNode } from "react";
import { FactTable } from "../table/table";

/** Body and signature side by side; under 1000 px the signature comes after. */
export function SignLayout({ children, panel }: { children: ReactNode; panel: ReactNode }) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_430px] rail:grid-cols-[minmax(0,1fr)]">
      <div className="min-w-0 px-gutter py-6 phone:px-4 phone:py-[18px]">{children}</div>
      {panel}
    </div>
  );
}

/**
 * What a person signs: the meaning in full sentences between rules, who, what and when, then the fields and the button.
 *
 * meaning    the sentence stored with the signature
 * facts      signing as, record, content digest, time (set by the server)
 * children   fields and the button
 * after      what follows from signing
 */
export function SignPanel({
  title,
  meaning,
  facts,
  children,
  after,
}: {
  title: ReactNode;
  meaning: ReactNode;
  facts: readonly { label: ReactNode; value: ReactNode }[];
  children: ReactNode;
  after?: ReactNode;
}) {
  return (
    <aside
      aria-label="Signature"
      className="border-l border-rule-2 bg-tint px-[26px] py-6 rail:border-l-0 rail:border-t phone:px-4 phone:py-[18px]"
    >
      <h2>{title}</h2>
      <p className="mb-1 mt-2.5 border-b-3 border-t border-double border-ink pb-3.5 pt-3 font-serif text-meaning font-medium [border-top-style:solid]">
        {meaning}
      </p>
      <FactTable caption="What is signed" facts={facts} />
      {children}
      {after && <p className="mt-4 border-t py-[9px] font-serif text-note text-ink-2">{after}</p>}
    </aside>
  );
}

/** A digest in groups of four, as people compare it. `short` keeps the first three groups and the last. */
export function Digest({ hex, short = false }: { hex: string; short?: boolean }) {
  const groups = hex.match(/.{1,4}/g) ?? [];
  const shown = short && groups.length > 5 ? [...groups.slice(0, 3), "…", groups.at(-1)] : groups;
  return (
    <span className="digest" title={short ? hex : undefined}>
      {shown.join(" ")}
    </span>
  );
}
