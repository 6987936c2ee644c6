/** How figures of a study are written: each has an SI unit, which tells the quantity. */
import type { FigureHead } from "@/engine/cases/study-case";
import type { QuantityId } from "@/engine/units";

const quantities: Record<FigureHead["unit"], { value: QuantityId; difference: QuantityId }> = {
  s: { value: "time", difference: "time" },
  K: { value: "temperature", difference: "temperatureDifference" },
  "kg/s": { value: "massRate", difference: "massRate" },
  kg: { value: "mass", difference: "mass" },
};

export const quantityOfFigure = ({ unit }: Pick<FigureHead, "unit">): QuantityId => quantities[unit].value;
export const differenceOfFigure = ({ unit }: Pick<FigureHead, "unit">): QuantityId => quantities[unit].difference;
