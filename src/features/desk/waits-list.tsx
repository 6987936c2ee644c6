import Link from "next/link";
import { ButtonLink } from "@/components/button/button-link";
import { EbbThumb } from "@/components/verdict/ebb-thumb";
import { pages } from "@/contracts/paths";
import type { DeskView, ScreeningRow } from "@/contracts/views";

type Waiting = DeskView["waits"][number];

/** What waits on an engineer: the record, why, and the next act as a button. */
export function WaitsList({ waits }: { waits: readonly Waiting[] }) {
  return (
    <ul className="border-t">
      {waits.map((row) => {
        const next = nextAct(row);
        return (
          <li
            key={row.id}
            className="grid grid-cols-[100px_96px_minmax(0,1fr)_auto] items-center gap-[18px] border-b py-[13px] phone:grid-cols-[1fr_auto] phone:gap-x-2.5 phone:gap-y-1"
          >
            <Link href={pages.screening(row.id)} className="text-[1.0625rem] font-semibold">
              {row.record}
            </Link>
            <EbbThumb ebb={row.ebb} />
            <span className="phone:col-span-2">
              <span className="text-[1.0625rem] font-semibold">
                {row.section.tag} {row.section.name}
              </span>{" "}
              {stateWords[row.state]}
              {row.facility.demo && <span className="text-ink-3"> demo</span>}
              <span className="block font-serif text-prose text-ink-2">{row.sentence ?? row.why}</span>
            </span>
            <span className="grid phone:col-span-2">
              <ButtonLink href={next.href}>{next.label}</ButtonLink>
            </span>
          </li>
        );
      })}
    </ul>
  );
}

const stateWords: Partial<Record<ScreeningRow["state"], string>> = {
  draft: "is in draft",
  computed: "is computed but not signed",
  returned: "was returned with remarks",
};

function nextAct({ id, state }: ScreeningRow): { label: string; href: string } {
  if (state === "returned") return { label: "Read the remarks", href: pages.screening(id) };
  if (state === "computed") return { label: "Review and sign", href: pages.sign(id) };
  return { label: "Continue", href: pages.part(id, "scope") };
}
