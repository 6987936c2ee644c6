/** A typed state as one short text of an address: "70 bar(g);35 °C". Text and unit come back as they were typed. */
import { unitSymbols } from "@/engine/units";
import type { StateQuantity, Typed, TypedState } from "../state/typed";

const apart = " ";

export const stateToText = ({ pressure, temperature }: TypedState): string =>
  [pressure, temperature].map(({ text, unit }) => `${text}${apart}${unit}`).join(";");

export function stateFromText(text: string): TypedState | null {
  const [p, T, ...rest] = text.split(";");
  if (p === undefined || T === undefined || rest.length > 0) return null;
  const [pressure, temperature] = [typedFrom("pressure", p), typedFrom("temperature", T)];
  return pressure && temperature ? { pressure, temperature } : null;
}

function typedFrom(quantity: StateQuantity, text: string): Typed | null {
  const at = text.lastIndexOf(apart);
  const unit = text.slice(at + 1);
  return at >= 0 && unitSymbols(quantity).includes(unit) ? { text: text.slice(0, at).slice(0, 40), unit } : null;
}
