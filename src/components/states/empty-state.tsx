import type { ReactNode } from "react";
import { EmptyAxes } from "./empty-axes";

/**
 * A list without entries: says so, and what to do first.
 *
 * axes     empty axes above, where curves will stand
 * action   a button or link
 */
export function EmptyState({
  title,
  children,
  action,
  axes = false,
}: {
  title: ReactNode;
  children?: ReactNode;
  action?: ReactNode;
  axes?: boolean;
}) {
  return (
    <section className="py-3">
      {axes && (
        <div className="mb-2.5">
          <EmptyAxes />
        </div>
      )}
      <h2 className="mb-1.5 text-head leading-[1.25]">{title}</h2>
      {children && <p className="mb-3 max-w-[52ch] font-serif text-prose text-ink-2">{children}</p>}
      {action && <div className="flex flex-wrap items-center gap-3">{action}</div>}
    </section>
  );
}
