import type { ReactNode } from "react";

export function SpecimenSection({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="min-w-0 border-t border-ink pt-2.5">
      <h2 className="mb-2">{title}</h2>
      {children}
    </section>
  );
}
