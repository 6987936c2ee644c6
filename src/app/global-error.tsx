"use client";

import { Button } from "@/components/button/button";
import { BarePage } from "@/components/shell/bare-page";
import { Stop } from "@/components/states/stop";
import "./globals.css";

/** Stands in for the root layout when that itself fails; so it brings its own document. */
export default function GlobalError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <html lang="en">
      <body>
        <BarePage>
          <Stop
            level={1}
            serious
            title="The product could not be drawn"
            action={
              <Button kind="main" onClick={reset}>
                Try again
              </Button>
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
        </BarePage>
      </body>
    </html>
  );
}
