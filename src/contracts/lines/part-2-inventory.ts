import type { Line, LineReader } from "./line";

const shapeIs = (...shapes: string[]) => (read: LineReader) => shapes.includes(read.choice("2.02") ?? "");
const item = { part: 2, group: "Vessel", perItem: true } as const;
const start = { part: 2, group: "Start condition" } as const;

export const inventoryLines: Line[] = [
  { ...item, kind: "text", no: "2.01", label: "Item", hint: "tag of the vessel or of the group", maxLength: 40 },
  {
    ...item,
    kind: "choice",
    no: "2.02",
    label: "Shape",
    radios: true,
    options: [
      { value: "volume", label: "Plain volume", phrase: "volume and inside surface given" },
      { value: "cylinder-horizontal", label: "Cylinder, horizontal", phrase: "with heads" },
      { value: "cylinder-vertical", label: "Cylinder, vertical", phrase: "with heads" },
      { value: "sphere", label: "Sphere", phrase: "inside diameter given" },
    ],
    initial: "cylinder-horizontal",
  },
  {
    ...item,
    kind: "choice",
    no: "2.03",
    label: "Heads",
    asked: shapeIs("cylinder-horizontal", "cylinder-vertical"),
    options: [
      { value: "ellipsoidal-2-1", label: "Ellipsoidal 2:1" },
      { value: "hemispherical", label: "Hemispherical" },
      { value: "torispherical-kloepper", label: "Torispherical, Klöpper (DIN 28011)" },
      { value: "torispherical-korbbogen", label: "Torispherical, Korbbogen (DIN 28013)" },
      { value: "torispherical-flanged-dished", label: "Torispherical, flanged and dished" },
      { value: "flat", label: "Flat" },
    ],
    initial: "ellipsoidal-2-1",
  },
  {
    ...item,
    kind: "quantity",
    no: "2.04",
    label: "Inside diameter",
    asked: shapeIs("cylinder-horizontal", "cylinder-vertical", "sphere"),
    quantity: "length",
    min: 0.01,
    max: 40,
    shown: { SI: "m", US: "in" },
  },
  {
    ...item,
    kind: "quantity",
    no: "2.05",
    label: "Length between tangents",
    asked: shapeIs("cylinder-horizontal", "cylinder-vertical"),
    quantity: "length",
    min: 0,
    max: 500,
    shown: { SI: "m", US: "ft" },
  },
  {
    ...item,
    kind: "quantity",
    no: "2.06",
    label: "Volume",
    hint: "what the closed valves hold in",
    asked: shapeIs("volume"),
    quantity: "volume",
    min: 1e-5,
    max: 1e5,
    shown: { SI: "m³", US: "ft³" },
  },
  { ...item, kind: "derived", no: "2.12", label: "Volume from the dimensions", asked: shapeIs("cylinder-horizontal", "cylinder-vertical", "sphere"), quantity: "volume", shown: { SI: "m³", US: "ft³" } },
  { ...start, kind: "quantity", no: "2.09", label: "Pressure at start", hint: "highest settled or operating pressure", quantity: "pressure", min: 1e4, max: 1e8, shown: { SI: "bar(g)", US: "psig" } },
  { ...start, kind: "quantity", no: "2.10", label: "Temperature at start", hint: "of the gas and of the wall", quantity: "temperature", min: 80, max: 900, shown: { SI: "°C", US: "°F" } },
];
