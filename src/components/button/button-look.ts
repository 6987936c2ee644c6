/** One main button a panel; quiet ones read as links; danger takes something away. */
export type ButtonKind = "main" | "plain" | "quiet" | "danger";

const common =
  "inline-flex min-h-[42px] items-center justify-center gap-2 whitespace-nowrap rounded border-1.5 text-body font-semibold leading-none phone:min-h-[46px] print:hidden " +
  "disabled:cursor-not-allowed disabled:text-ink-3 aria-disabled:cursor-not-allowed aria-disabled:text-ink-3 " +
  "disabled:no-underline aria-disabled:no-underline";

const waiting = "disabled:border-rule-2 disabled:bg-tint aria-disabled:border-rule-2 aria-disabled:bg-tint";

const looks: Record<ButtonKind, string> = {
  main: `border-tide-deep bg-tide-deep px-[18px] text-on-tide no-underline ${waiting}`,
  plain: `border-ink bg-transparent px-[18px] text-ink no-underline ${waiting}`,
  quiet: "border-transparent bg-transparent px-1.5 font-medium text-tide underline underline-offset-[.2em]",
  danger: `border-beyond bg-transparent px-[18px] text-beyond no-underline ${waiting}`,
};

export const buttonLook = (kind: ButtonKind, full = false): string => `${common} ${looks[kind]}${full ? " w-full" : ""}`;
