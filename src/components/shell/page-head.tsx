import type { ReactNode } from "react";

/** The first row of a page: its title and, at the right, the page's actions. */
export function PageHead({ title, children }: { title: ReactNode; children?: ReactNode }) {
  return (
    <div className="mb-[22px] flex flex-wrap items-center justify-between gap-3">
      <h1>{title}</h1>
      {children && <div className="flex flex-wrap items-center gap-3 print:hidden">{children}</div>}
    </div>
  );
}

/** Title of a part of the form over a heavy rule; `children` stand at the right in small type (the keys of source marks, the units shown). */
export function PartHead({ no, title, children }: { no: number; title: string; children?: ReactNode }) {
  return (
    <div className="flex items-baseline justify-between gap-4 border-b-1.5 border-ink pb-2 phone:block">
      <h1>
        {no}
        {"\u2002"}
        {title}
      </h1>
      {children && <span className="text-small text-ink-3">{children}</span>}
    </div>
  );
}

/** Heading of a group of lines. */
export function GroupHead({ children, aside }: { children: ReactNode; aside?: ReactNode }) {
  return (
    <h2 className="flex items-baseline justify-between gap-4 border-b border-rule-2 pb-[5px] pt-4 text-[1.0625rem] leading-[1.2]">
      {children}
      {aside && <span className="font-num text-small font-normal text-ink-3">{aside}</span>}
    </h2>
  );
}

/** Buttons and short remarks in a row. */
export function ButtonRow({ children }: { children: ReactNode }) {
  return <div className="mt-[18px] flex flex-wrap items-center gap-3 print:hidden">{children}</div>;
}
