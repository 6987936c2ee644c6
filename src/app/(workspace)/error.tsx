"use client";

import { Button } from "@/components/button/button";
import { ButtonLink } from "@/components/button/button-link";
import { Sheet, SheetBody } from "@/components/shell/sheet";
import { Stop } from "@/components/states/stop";
import { pages } from "@/contracts/paths";

/** A page of the workspace could not be drawn; the strip stays. */
export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <Sheet>
      <SheetBody>
        <Stop
          level={1}
          serious
          title="This page could not be drawn"
          action={
            <>
              <Button kind="main" onClick={reset}>
                Try again
              </Button>
              <ButtonLink href={pages.desk} kind="quiet">
                Back to the desk
              </ButtonLink>
            </>
          }
        >
          The fault is ours, not yours. Nothing was changed by it, and what was kept before is still kept.
          {error.digest && (
            <>
              {" "}
              When you report it, give the reference <span className="digest">{error.digest}</span>.
            </>
          )}
        </Stop>
      </SheetBody>
    </Sheet>
  );
}
