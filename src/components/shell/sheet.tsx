import type { ReactNode } from "react";

/** The paper of a page, with the skip link's target. At most 1680 px wide, the desk shows at both sides. */
export function Sheet({ children }: { children: ReactNode }) {
  return (
    <main
      id="main"
      tabIndex={-1}
      className="mx-auto flex min-h-[calc(100vh-53px)] max-w-sheet flex-col border-x border-rule-2 bg-sheet focus:outline-none print:block print:max-w-none print:border-0 [&>:last-child]:flex-1"
    >
      {children}
    </main>
  );
}

/** Padding of a sheet's body. */
export function SheetBody({ children }: { children: ReactNode }) {
  return <div className="min-w-0 px-gutter py-6 phone:px-4 phone:py-[18px]">{children}</div>;
}

/**
 * A sheet with body and margin. Under 1100 px the margin moves beneath the body.
 *
 * titleBlock    a `<TitleBlock />`, or nothing
 * margin        notes, as `<MarginHead />` and `<MarginNote />`
 * marginLabel   names the margin for screen readers
 * wideMargin    452 px instead of 320, for an entry or a signature
 */
export function SheetWithMargin({
  titleBlock,
  margin,
  marginLabel = "Margin notes",
  wideMargin = false,
  children,
}: {
  titleBlock?: ReactNode;
  margin: ReactNode;
  marginLabel?: string;
  wideMargin?: boolean;
  children: ReactNode;
}) {
  return (
    <Sheet>
      {titleBlock}
      <div
        className={`grid ${wideMargin ? "grid-cols-[minmax(0,1fr)_452px]" : "grid-cols-[minmax(0,1fr)_320px]"} rail:grid-cols-[minmax(0,1fr)] print:block`}
      >
        <SheetBody>{children}</SheetBody>
        <aside
          aria-label={marginLabel}
          className="border-l border-rule-2 bg-tint p-[22px] rail:border-l-0 rail:border-t phone:px-4 phone:py-[18px] print:border-0"
        >
          {margin}
        </aside>
      </div>
    </Sheet>
  );
}

/**
 * The form's sheet: parts at the left, lines, Forerun at the right. Under 1240 px the Forerun moves beneath the lines. Under 720 px the
 * parts become a row that scrolls inside itself, and where there is a bar the Forerun opens above it.
 *
 * forerunBar    stands at the foot of a phone's screen; `forerunId` and `forerunOpen` say what it opens, and whether it is open
 */
export function FormSheet({
  titleBlock,
  parts,
  forerun,
  forerunLabel = "Forerun",
  forerunBar,
  forerunId,
  forerunOpen = false,
  children,
}: {
  titleBlock?: ReactNode;
  parts: ReactNode;
  forerun?: ReactNode;
  forerunLabel?: string;
  forerunBar?: ReactNode;
  forerunId?: string;
  forerunOpen?: boolean;
  children: ReactNode;
}) {
  return (
    <Sheet>
      {titleBlock}
      <div
        className={`grid grid-cols-[150px_minmax(0,1fr)] phone:flex phone:flex-col print:block ${
          forerun ? "wide:grid-cols-[188px_minmax(0,1fr)_372px]" : "wide:grid-cols-[188px_minmax(0,1fr)]"
        }`}
      >
        {parts}
        <div className="min-w-0 px-6 pb-[26px] pt-5 phone:p-4">{children}</div>
        {forerun && (
          <aside
            id={forerunId}
            aria-label={forerunLabel}
            className={`col-span-2 border-t border-rule-2 bg-tint px-[18px] py-4 wide:col-span-1 wide:border-l wide:border-t-0 ${
              !forerunBar
                ? ""
                : forerunOpen
                  ? "phone:fixed phone:inset-x-0 phone:bottom-[58px] phone:z-10 phone:max-h-[75vh] phone:overflow-y-auto phone:border-t-1.5 phone:border-ink"
                  : "phone:hidden"
            }`}
          >
            {forerun}
          </aside>
        )}
        {forerunBar && (
          <div className="hidden phone:sticky phone:bottom-0 phone:z-10 phone:mt-auto phone:block print:hidden">{forerunBar}</div>
        )}
      </div>
    </Sheet>
  );
}
