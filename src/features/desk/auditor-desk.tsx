import type { ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { formatNumber } from "@/components/quantity/format";
import { formatUtc } from "@/components/quantity/format-time";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { Digest } from "@/components/sign/sign-panel";
import { pages } from "@/contracts/paths";
import type { DeskView } from "@/contracts/views";

/**
 * An auditor's first page: how far the log has come, and the records it speaks of. Whether it holds is found by checking, not said here.
 *
 * children   the table of signed records
 */
export function AuditorDesk({ desk, now, children }: { desk: DeskView; now: string; children: ReactNode }) {
  const { size, headHash, lastAt } = desk.log;
  return (
    <SheetWithMargin
      margin={
        <>
          <WhatASealProves />
          {headHash && (
            <>
              <MarginHead>Head of the chain</MarginHead>
              <p className="border-t py-[9px]">
                <Digest hex={headHash} />
              </p>
            </>
          )}
        </>
      }
    >
      <PageHead title={size === 0 ? "The log has no entry yet" : `The log has come to entry ${size}`}>
        <ButtonLink kind="main" href={`${pages.log}?verify=now`}>
          Verify now
        </ButtonLink>
        <ButtonLink href={pages.log}>Read the log</ButtonLink>
      </PageHead>
      <dl className="grid grid-cols-2 border-b-3 border-t border-double border-ink [border-top-style:solid] [&>div]:px-[18px] [&>div]:pb-4 [&>div]:pt-3.5">
        <div className="border-r !pl-0">
          <dt className="text-small text-ink-3">Entries</dt>
          <dd className="text-fig font-medium">{formatNumber(size, { decimals: 0 })}</dd>
        </div>
        <div>
          <dt className="text-small text-ink-3">Newest entry, UTC</dt>
          <dd className="text-head font-medium">{lastAt ? formatUtc(lastAt, now) : "–"}</dd>
        </div>
      </dl>
      <h2 className="mb-1 mt-7">Signed records</h2>
      {children}
    </SheetWithMargin>
  );
}

export function WhatASealProves() {
  return (
    <>
      <MarginHead>What a seal proves</MarginHead>
      <MarginNote>
        Each entry holds the digest of the one before it. Change one character anywhere and every later seal fails.
      </MarginNote>
      <MarginNote>
        It proves order and integrity. It doesn’t prove that the figures are right, or that the person was entitled to sign.
      </MarginNote>
    </>
  );
}
