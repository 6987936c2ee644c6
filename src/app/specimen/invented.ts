/** Invented figures that only show how things look. No run produced them. */
const minutes = Array.from({ length: 101 }, (_, i) => i * 0.25);
const pressure = minutes.map((t) => 84 * Math.exp(-t / 5.5));
const ambient = 8.5;

export const invented = {
  minutes,
  pressure,
  vent: minutes.map((t) => 12.7 * Math.exp(-t / 5)),
  fluid: minutes.map((t) => ambient - 66 * (t / 9) * Math.exp(1 - t / 9)),
  wall: minutes.map((t) => ambient - 36 * (1 - Math.exp(-((t / 9) ** 1.5)))),
  wallBefore: minutes.map((t) => ambient - 31 * (1 - Math.exp(-((t / 9) ** 1.5)))),
  ebb: { x: minutes.map((t) => t / 30), y: pressure.map((p) => p / 84), postX: 0.52, beyond: false },
};
