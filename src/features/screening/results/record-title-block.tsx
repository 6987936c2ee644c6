import { TitleBlock } from "@/components/shell/title-block";
import { StateWord } from "@/components/verdict/state-word";
import type { ScreeningView } from "@/contracts/views";
import { recordTitle } from "./record-title";

/** Which record this is, and where it stands. */
export function RecordTitleBlock({ screening }: { screening: ScreeningView }) {
  return <TitleBlock cells={[...recordTitle(screening), { label: "State", value: <StateWord state={screening.state} /> }]} />;
}
