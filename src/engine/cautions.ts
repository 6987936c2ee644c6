/**
 * The only place of the standing cautions' words. A result carries the ones that apply, with the figures of its run put in; a signature
 * stores them as shown. C4 to C6 are worded here too, for the sheets and records that add them.
 */
export type CautionId =
  | "C1"
  | "C2"
  | "C3"
  | "C4"
  | "C5"
  | "C6"
  | "C7"
  | "M-equation"
  | "M-film"
  | "M-steel"
  | "M-opening"
  | "M-settle-out"
  | "M-restart"
  | "M-rupture"
  | "M-study";

export type Caution = { id: CautionId; words: string };

export type WallModelInUse = "none" | "lumped" | "conduction";

export const screeningCaution: Caution = {
  id: "C1",
  words:
    "This is a screening. It does not size, rate or approve equipment. A licensed engineer reviews it under the code that applies at the site before anyone relies on it.",
};

/** C2, worded by the wall model in use. */
export function oneTemperatureCaution(wall: WallModelInUse, zones: "one" | "separate" = "one"): Caution {
  if (zones === "separate") {
    return {
      id: "C2",
      words:
        wall === "none"
          ? "Vapour and liquid have one temperature each, and no wall is in the balance: nothing here says how cold the steel gets. Nozzles, supports and dead legs can be colder than the fluid shown here."
          : "Vapour and liquid have one temperature each, and so has the steel that each touches. How fast heat passes between them is known to a factor of two at best. Nozzles, supports and dead legs can be colder than the wall shown here.",
    };
  }
  const words: Record<WallModelInUse, string> = {
    none: "One gas temperature stands for the whole vessel, and no wall is in the balance: nothing here says how cold the steel gets. Nozzles, supports, dead legs and the liquid space can be colder than the fluid shown here.",
    lumped:
      "One gas temperature and one wall temperature stand for the whole vessel. Nozzles, supports, dead legs and the liquid space can be colder than the wall shown here.",
    conduction:
      "One gas temperature stands for the whole vessel, and the wall's temperature varies through its thickness only. Nozzles, supports, dead legs and the liquid space can be colder than the wall shown here.",
  };
  return { id: "C2", words: words[wall] };
}

/** C3, when the path crosses the dew line at a temperature. */
export const liquidCaution = (temperatureK: number): Caution => ({
  id: "C3",
  words: `Liquid is likely to form below about ${celsius(temperatureK)}. Liquid that boils on the wall can take it below the figure on line 7.02.`,
});

export const fireCaution: Caution = {
  id: "C4",
  words:
    "The fire is a uniform heat flux taken from the standard named on line 6.05. A jet fire on bare steel can weaken a wall faster than any relief device lowers its stress.",
};

export const standOffCaution: Caution = {
  id: "C5",
  words: "Distances come from an ideal release in the open. Fragments fly farther, and walls and terrain change the wave.",
};

export const assumedLinesCaution = (lines: number): Caution => ({
  id: "C6",
  words: `${lines === 1 ? "1 line rests" : `${lines} lines rest`} on assumption. They are listed in the margin and on page 1 of the record.`,
});

export const outsideDataCaution: Caution = {
  id: "C7",
  words: "Property data were used outside the range on their source. The line is marked.",
};

export const equationCaution: Caution = {
  id: "M-equation",
  words:
    "Energies come from a cubic equation of state. Its liquid densities and its near-critical values are approximate; see the accuracy line.",
};

export const filmCaution: Caution = {
  id: "M-film",
  words:
    "Temperatures after the first third of the blowdown depend mainly on the inside film coefficient, which is known to about plus or minus 50 %.",
};

export const steelCaution: Caution = {
  id: "M-steel",
  words:
    "A positive margin is not an approval. Minimum design temperature, impact testing and stress reduction are decided under the vessel code by a competent person.",
};

export const openingCaution: Caution = {
  id: "M-opening",
  words: "The opening time lowers the peak load. It must not be credited unless the valve's stroke has been tested.",
};

export const settleOutCaution: Caution = {
  id: "M-settle-out",
  words:
    "Settle-out assumes that every listed volume equalises and that no running-down machine does work. Use the higher of settle-out and highest normal operating pressure as the initial pressure.",
};

export const restartCaution: Caution = {
  id: "M-restart",
  words:
    "After blowdown the metal is cold while the pressure is low. Re-pressurising before the metal is above its permitted temperature at that pressure is the classic brittle-fracture route. The screening ends at the stop time; hold, warm-up and restart must be covered by a procedure.",
};

export const ruptureCaution: Caution = {
  id: "M-rupture",
  words: "Rupture time is an order-of-magnitude indicator: plus or minus 30 % in flux changes it by about the same amount.",
};

export const studyCaution: Caution = {
  id: "M-study",
  words:
    "A percentile does not replace the worst credible case that a rule asks for. Inputs were varied independently of each other, within the bands shown.",
};

/** Of relief methods and scenarios. */
export const reliefCaution =
  "Relief case list, simultaneous events and device type are decided by the responsible engineer; the area shown is not a purchase specification.";

/** Of held energy and blast. */
export const fragmentCaution = "Fragment hazard is not quantified; for vessel bursts it usually governs the distance.";

/** Of fire on a dry wall. */
export const dryWallCaution =
  "A relief device does not protect a dry wall: the metal can fail below the set pressure. See the time to rupture.";

/** "−9 °C", with the true minus sign and a no-break space. */
function celsius(temperatureK: number): string {
  const rounded = Math.round(temperatureK - 273.15);
  return `${rounded < 0 ? "\u2212" : ""}${Math.abs(rounded)}\u00a0°C`;
}
