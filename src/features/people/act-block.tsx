import type { ReactNode } from "react";
import type { ChangePerson } from "@/contracts/requests";
import type { PersonDetailView } from "@/contracts/views";

/**
 * What every act on an account is given.
 *
 * send   does it, and says the words once it is done
 */
export type ActProps = { person: PersonDetailView; busy: boolean; send: (change: ChangePerson, words: string) => void };

/** One act: what it is called and what it leaves behind. */
export function ActBlock({ title, says, children }: { title: string; says: string; children: ReactNode }) {
  return (
    <div className="mt-5 border-t border-ink pt-3">
      <h3>{title}</h3>
      <p className="font-serif text-note text-ink-2">{says}</p>
      {children}
    </div>
  );
}
