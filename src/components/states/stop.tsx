import type { ReactNode } from "react";
import { WarningSign } from "../line/warning-sign";

/**
 * Something did not go on: a run that stopped, a seal that does not hold, a page that is not there.
 *
 * title      what happened, in a sentence without a full stop
 * children   why we think so and what it means
 * action     what to do now
 * serious    the sign and the colour of beyond; otherwise plain
 * level      of the heading
 */
export function Stop({
  title,
  children,
  action,
  serious = false,
  level = 2,
}: {
  title: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  serious?: boolean;
  level?: 1 | 2;
}) {
  const Heading = level === 1 ? "h1" : "h2";
  return (
    <section className="py-3">
      <Heading className={`mb-1.5 flex items-center gap-[9px] text-head leading-[1.25] ${serious ? "text-beyond" : ""}`}>
        {serious && <WarningSign size={18} />}
        {title}
      </Heading>
      {children && <div className="mb-3 max-w-[60ch] font-serif text-prose text-ink-2">{children}</div>}
      {action && <div className="flex flex-wrap items-center gap-3">{action}</div>}
    </section>
  );
}
