import { ButtonLink } from "@/components/button/button-link";
import { EmptyState } from "@/components/states/empty-state";
import { pages } from "@/contracts/paths";

/**
 * Nothing has been screened.
 *
 * mayCreate   offers to begin
 * sectionId   begins in this section
 */
export function NoScreenings({ mayCreate, sectionId }: { mayCreate: boolean; sectionId?: string }) {
  return (
    <EmptyState
      axes
      title="Nothing has been screened here yet."
      action={
        mayCreate && (
          <ButtonLink kind="main" href={pages.newScreening(sectionId)}>
            New screening
          </ButtonLink>
        )
      }
    >
      Start with the isolatable section: what it holds, how it is walled in, and where it vents to.
    </EmptyState>
  );
}
