import { ButtonLink } from "@/components/button/button-link";
import { EmptyState } from "@/components/states/empty-state";
import { pages } from "@/contracts/paths";
import type { ScreeningView } from "@/contracts/views";
import { ComputeButton } from "./compute-button";

/** A sheet without a run: no curve is drawn, and it says what comes first. */
export function NotComputed({ screening }: { screening: ScreeningView }) {
  const { id, may, draft } = screening;
  return (
    <>
      <h1 className="sr-only">
        {screening.record} rev {screening.rev}
      </h1>
      <EmptyState
        axes
        title={`${screening.record} rev ${screening.rev} is not computed yet`}
        action={
          <>
            {may.edit && (
              <ButtonLink kind="main" href={pages.part(id, "scope")}>
                Go to the lines
              </ButtonLink>
            )}
            {may.compute && draft && <ComputeButton draft={draft}>Compute in full</ComputeButton>}
          </>
        }
      >
        Figures, limits and cautions stand here once the lines of parts 1 to 7 are entered and computed in full. Until then there
        is nothing to rely on.
      </EmptyState>
    </>
  );
}
