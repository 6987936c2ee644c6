import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { ButtonLink } from "@/components/button/button-link";
import { EmptyState } from "@/components/states/empty-state";
import { SheetWithMargin } from "@/components/shell/sheet";
import { SitePressure } from "@/components/units/units-provider";
import { caseKindWords } from "@/contracts/draft";
import { pages } from "@/contracts/paths";
import type { ScreeningView } from "@/contracts/views";
import { CompareMargin, CompareSheet } from "@/features/screening/compare/compare-sheet";
import { sideOf } from "@/features/screening/compare/sides";
import { RecordTitleBlock } from "@/features/screening/results/record-title-block";
import { requireViewer, type Viewer } from "@/server/auth/viewer";
import { getScreening } from "@/server/screenings/read";
import type { SearchParams } from "../../../query";

export const metadata: Metadata = { title: "Side by side" };

type Props = { params: Promise<{ screeningId: string }>; searchParams: Promise<SearchParams> };

/** Sides are written "2-B": revision and case letter. */
type SideAsked = { rev: number; letter: string };

export default async function ComparePage({ params, searchParams }: Props) {
  const viewer = await requireViewer();
  const [{ screeningId }, query] = await Promise.all([params, searchParams]);
  const newest = await getScreening(viewer, screeningId);
  if (!newest) notFound();
  const computed = await computedRevisions(viewer, newest);
  const choices = computed.flatMap(({ rev, prepared }) =>
    (prepared?.content.cases ?? []).map(({ letter, kind }) => ({
      value: `${rev}-${letter}`,
      label: `Rev ${rev}, ${letter} ${caseKindWords[kind]}`,
    })),
  );
  const [first] = choices;
  const earlier = choices.find(({ value }) => value.split("-")[0] !== first?.value.split("-")[0]);
  // Left open: the revision before against the newest, or the first case against the second.
  const to = asked(query.to, choices) ?? (earlier ? first : choices[1]);
  const from = asked(query.from, choices) ?? earlier ?? first;
  const sides = [from, to].map((choice) => {
    const { rev, letter } = sideAsked(choice?.value);
    const view = computed.find((one) => one.rev === rev);
    return view?.prepared ? sideOf(view.prepared, letter, (of) => `rev ${rev}, ${of}`) : undefined;
  });
  const [one, other] = sides;
  const titleBlock = <RecordTitleBlock screening={newest} />;
  const back = <ButtonLink href={pages.screening(screeningId)}>Back to the sheet</ButtonLink>;
  if (!one || !other || !from || !to) {
    return (
      <SheetWithMargin titleBlock={titleBlock} margin={null}>
        <EmptyState title="Nothing to lay side by side" action={back}>
          There is one computed case only. A second case on the form, or another revision, gives something to lay beside it.
        </EmptyState>
      </SheetWithMargin>
    );
  }
  return (
    <SitePressure barometricPressurePa={other.content.barometricPressurePa}>
      <SheetWithMargin titleBlock={titleBlock} margin={<CompareMargin from={one} to={other} />}>
        <CompareSheet
          from={one}
          to={other}
          chosen={{ from: from.value, to: to.value }}
          choices={choices}
          path={pages.compare(screeningId)}
        />
        <div className="mt-7">{back}</div>
      </SheetWithMargin>
    </SitePressure>
  );
}

/** Revisions that hold a computed content, the newest first. A long history is cut: what is older can be read on its own sheet. */
async function computedRevisions(viewer: Viewer, newest: ScreeningView): Promise<ScreeningView[]> {
  const others = newest.revisions.filter(({ rev }) => rev !== newest.rev).slice(0, 5);
  const views = await Promise.all(others.map(({ rev }) => getScreening(viewer, newest.id, rev)));
  return [newest, ...views.filter((view) => view !== null)].filter(({ prepared }) => prepared !== null);
}

const asked = <Choice extends { value: string }>(given: string | string[] | undefined, choices: readonly Choice[]) =>
  choices.find(({ value }) => value === given);

function sideAsked(value: string | undefined): Partial<SideAsked> {
  const [rev, letter] = value?.split("-") ?? [];
  return rev && letter ? { rev: Number(rev), letter } : {};
}
