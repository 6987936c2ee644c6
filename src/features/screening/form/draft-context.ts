"use client";

import { createContext, useContext } from "react";
import type { CaseKind, DraftDocument, LineValue } from "@/contracts/draft";
import type { CaseFromDraft, SiteFacts } from "@/contracts/draft-to-case";
import type { LineKey, QuantityLine } from "@/contracts/lines/line";
import type { DraftView } from "@/contracts/views";
import type { LineErrors } from "./line-schema";
import type { Keeper } from "./use-keeper";

/** What a form page needs of the screening it belongs to. */
export type FormSubject = {
  screeningId: string;
  record: string;
  section: { id: string; tag: string; name: string };
  facility: { id: string; name: string; demo: boolean };
  author: string;
  site: SiteFacts;
};

/** The draft in hand: read and changed by the lines, kept by the keeper, run by the Forerun. */
export type DraftInHand = {
  subject: FormSubject;
  start: DraftView;
  draft: DraftDocument;
  editable: boolean;
  errors: LineErrors;
  /** Letter of the case in hand; parts 5 to 7 and the forerun are of this one. */
  letter: string;
  /** The case in hand as it stands, or what is in its way. */
  made: CaseFromDraft;
  /** Every case of the draft, in their order. */
  cases: { letter: string; kind: CaseKind; made: CaseFromDraft }[];
  keeper: Keeper;
  setLine: (key: LineKey, change: Partial<LineValue>) => void;
  setCases: (change: (before: DraftDocument) => DraftDocument) => void;
  setComposition: (change: Partial<DraftDocument["composition"]>) => void;
  unitOf: (key: LineKey, line: QuantityLine) => string;
  chooseUnit: (key: LineKey, unit: string) => void;
};

export const DraftContext = createContext<DraftInHand | null>(null);

export function useDraft(): DraftInHand {
  const draft = useContext(DraftContext);
  if (!draft) throw new Error("a line of the form stands outside its draft");
  return draft;
}
