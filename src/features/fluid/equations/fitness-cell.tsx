import type { FitnessVerdict } from "@/engine/eos/fitness";
import { sentence } from "../engine/sentence";
import { fitnessWords, isAdmitted } from "./fitness-words";

/** Room for the words of the first two columns of a table, off phones. */
export const wideFirst = "[&_thead_th:first-child]:w-[32%] [&_thead_th:nth-child(2)]:w-[17%]";

type Props = { title: string; verdict: FitnessVerdict; notes: readonly string[]; inUse: boolean };

/** Name of an equation, whether it is the one in use, how fit it is and why. */
export function FitnessCell({ title, verdict, notes, inUse }: Props) {
  return (
    <>
      <b>{title}</b>
      {inUse && <span className="ml-2 whitespace-nowrap text-label font-semibold text-tide">in use</span>}
      <span className={`block text-small ${isAdmitted(verdict) ? "text-ink-2" : "text-near"}`}>{fitnessWords[verdict]}</span>
      {notes.map((note) => (
        <span key={note} className="block font-serif text-label leading-[1.35] text-ink-3">
          {sentence(note)}
        </span>
      ))}
    </>
  );
}
