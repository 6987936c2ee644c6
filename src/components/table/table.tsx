import type { ComponentPropsWithoutRef, ReactNode } from "react";

/**
 * A table of ruled lines.
 *
 * caption   names it for readers by ear; `showCaption` sets it in serif above the head
 * settled   closes it with a double rule
 * stack     on phones each row becomes a block, and cells with a `label` carry it above their value. Default: yes
 */
export function Table({
  caption,
  showCaption = false,
  settled = false,
  stack = true,
  children,
}: {
  caption: string;
  showCaption?: boolean;
  settled?: boolean;
  stack?: boolean;
  children: ReactNode;
}) {
  return (
    <table className={`ruled${stack ? " stack" : ""}${settled ? " settled" : ""}`}>
      <caption className={showCaption ? "pb-1 text-left font-serif text-head font-medium" : "sr-only"}>{caption}</caption>
      {children}
    </table>
  );
}

type HeadProps = { numeric?: boolean; hideOnPhone?: boolean; children?: ReactNode };

/** Head of a column. */
export function HeadCell({ numeric, hideOnPhone, children }: HeadProps) {
  return (
    <th scope="col" className={`${numeric ? "numeric" : ""} ${hideOnPhone ? "phone:hidden" : ""}`}>
      {children}
    </th>
  );
}

type CellProps = Omit<ComponentPropsWithoutRef<"td">, "className" | "style"> & {
  /** Right-aligned, unbroken. */
  numeric?: boolean;
  strong?: boolean;
  muted?: boolean;
  /** Never broken over two lines. */
  unbroken?: boolean;
  /** Stands above the value on phones. */
  label?: string;
  /** Takes the whole row on phones. */
  wholeRow?: boolean;
  hideOnPhone?: boolean;
  /** Heads its row. */
  head?: boolean;
};

export function Cell({ numeric, strong, muted, unbroken, label, wholeRow, hideOnPhone, head, children, ...rest }: CellProps) {
  const look = [
    numeric && "numeric",
    strong && "!font-semibold",
    muted && "text-ink-3",
    unbroken && "keep-together whitespace-nowrap",
    wholeRow && "whole-row",
    hideOnPhone && "phone:hidden",
  ]
    .filter(Boolean)
    .join(" ");
  const Tag = head ? "th" : "td";
  return (
    <Tag {...(head ? { scope: "row" } : {})} {...rest} data-label={label} className={look || undefined}>
      {children}
    </Tag>
  );
}

/**
 * A row.
 *
 * chosen   washed and barred: the row in hand
 * total    closed by a double rule: a settled sum
 */
export function Row({ chosen, total, children }: { chosen?: boolean; total?: boolean; children: ReactNode }) {
  return (
    <tr aria-current={chosen || undefined} className={chosen ? "chosen" : total ? "total" : undefined}>
      {children}
    </tr>
  );
}

/** A table of two columns: what, and its value. */
export function FactTable({
  caption,
  facts,
  settled,
}: {
  caption: string;
  facts: readonly { label: ReactNode; value: ReactNode }[];
  settled?: boolean;
}) {
  return (
    <table className={`ruled${settled ? " settled" : ""}`}>
      <caption className="sr-only">{caption}</caption>
      <tbody>
        {facts.map(({ label, value }, index) => (
          <tr key={index}>
            <th scope="row" className="w-[40%] !text-ink-3">
              {label}
            </th>
            <td>{value}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
