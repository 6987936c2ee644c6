import Link from "next/link";

export type Step = { name: string; href: string; state: "current" | "done" | "to-do" };

/** The steps of one act on a phone, each one screen. Any of them can be left and entered again. */
export function StepBar({ steps, label }: { steps: readonly Step[]; label: string }) {
  return (
    <nav aria-label={label} className="border-b border-rule-2 bg-tint">
      <ol className="flex">
        {steps.map(({ name, href, state }, index) => (
          <li key={name} className="flex-1">
            <Link
              href={href}
              aria-current={state === "current" ? "step" : undefined}
              className="block min-h-[44px] border-b-4 border-transparent px-1 pb-[5px] pt-1.5 text-center text-label leading-[1.2] text-ink-3 no-underline aria-[current]:border-tide aria-[current]:bg-sheet aria-[current]:font-semibold aria-[current]:text-ink focus-visible:-outline-offset-[3px]"
            >
              <span className="block font-serif text-sub font-medium leading-[1.1]">
                {index + 1}
                {state === "done" && (
                  <svg
                    width="10"
                    height="9"
                    viewBox="0 0 14 12"
                    aria-hidden="true"
                    fill="none"
                    className="ml-1 stroke-within"
                    strokeWidth="2.6"
                  >
                    <path d="M1 6.5L5 10.5 13 1" />
                  </svg>
                )}
              </span>
              {name}
              {state === "done" && <span className="sr-only">, done</span>}
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}
