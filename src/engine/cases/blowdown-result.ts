/** The result document of a blowdown. Times from the opening of the valve; energies on the zero of `eos/fluid-model.ts`. */

export type EndedBy = "pressure" | "time" | "solid-phase" | "back-pressure" | "too-hot";
export type Verdict = "within" | "near" | "beyond" | "open";

export type BlowdownSummary = {
  initialMassKg: number;
  finalMassKg: number;
  ventedMassKg: number;
  initialPressurePa: number;
  initialTemperatureK: number;
  finalTemperatureK: number;
  finalPressurePa: number;
  endTimeS: number;
  endedBy: EndedBy;
  peakVentRateKgPerS: number;
  peakVentRateTimeS: number;
  minimumFluidTemperatureK: number;
  minimumFluidTemperatureTimeS: number;
  minimumWallTemperatureK?: number;
  minimumWallTemperatureTimeS?: number;
  minimumOutletTemperatureK: number;
  minimumOutletTemperatureTimeS: number;
  /** Absent when not reached. */
  timeToHalfGaugePressureS?: number;
  timeToSixPointNineBarGaugeS?: number;
  timeToTargetPressureS?: number;
  /** The bore that was searched for, where the case asks for one. */
  sizedDiameterM?: number;
  energyVentedJ: number;
  heatFromWallJ: number;
  heatFromOutsideJ: number;
  /** From rebuilt states against what the integrator carried along. */
  massClosure: number;
  energyClosure: number;
  /** The same with outflow and heat counted again by quadrature of the rates along the run: what the integration itself lost. */
  massClosureRecounted?: number;
  energyClosureRecounted?: number;
};

/** Columns of equal length. A phase change or a jump has its time twice: before, after. Absent columns do not apply. */
export type BlowdownSeries = {
  timeS: number[];
  pressurePa: number[];
  fluidTemperatureK: number[];
  vapourTemperatureK?: number[];
  liquidTemperatureK?: number[];
  gasWallTemperatureK?: number[];
  liquidWallTemperatureK?: number[];
  massKg: number[];
  ventRateKgPerS: number[];
  ventedMassKg: number[];
  ventedEnergyJ: number[];
  vapourMoleFraction: number[];
  liquidLevelM?: number[];
  outletTemperatureK: number[];
  /** Directly behind the opening, where a tail pipe follows it. */
  backPressurePa?: number[];
};

/** Three steps between the first state and another, J/mol of the fluid that is there, and the balance of the whole run. */
export type ThreeSteps = { departureOut: number; idealGas: number; departureBack: number; total: number };
export type EnergyAccount = {
  /** From the state at the start to the coldest state of the fluid. */
  startToColdest: {
    internalEnergyJPerMol: ThreeSteps;
    enthalpyJPerMol: ThreeSteps;
    entropyJPerMolK: ThreeSteps;
    atTimeS: number;
  };
  /** From the state at the start to the state at the end. */
  startToEnd: { internalEnergyJPerMol: ThreeSteps; enthalpyJPerMol: ThreeSteps; entropyJPerMolK: ThreeSteps; atTimeS: number };
  /** start + heatFromWall + heatFromOutside − vented − end = leftOver */
  wholeRun: { startJ: number; heatFromWallJ: number; heatFromOutsideJ: number; ventedJ: number; endJ: number; leftOverJ: number };
};

export type LimitId =
  | "time-to-target"
  | "minimum-wall-temperature"
  | "minimum-liquid-wall-temperature"
  | "minimum-outlet-temperature"
  | "peak-vent-rate"
  | "solids"
  | "solids-behind-opening"
  | "hydrate"
  | "liquid-carry-over"
  | "least-strength-ratio";

export type AssessedLimit = {
  id: LimitId;
  title: string;
  /** Absent when the run did not give one. */
  value?: number;
  /** Absent when none was entered. */
  limit?: number;
  /** SI unit of both. */
  unit: "s" | "K" | "kg/s" | "1";
  /** Value and limit are differences of temperature, not temperatures. */
  difference?: true;
  /** Which side of the limit is the right one. */
  sense: "at-most" | "at-least";
  /** Distance left to the limit in its unit; negative past it. */
  inHand?: number;
  /** Part of the limit used up, where that makes sense (not for temperatures). */
  share?: number;
  verdict: Verdict;
  governs: boolean;
  /** Why a line is open, or what stands beside the figure. */
  note?: string;
};

/** Several vessels before and after they were joined; a positive `movesKg` is received. */
export type SettleOutReport = {
  vessels: { name: string; volumeM3: number; pressurePa: number; temperatureK: number; massKg: number; movesKg: number }[];
  after: { volumeM3: number; pressurePa: number; temperatureK: number; massKg: number; vapourMoleFraction: number };
  composition: Record<string, number>;
  internalEnergyBeforeJ: number;
  internalEnergyAfterJ: number;
  heatFromSteelJ: number;
  massClosure: number;
  energyClosure: number;
  steelTemperatureK?: number;
  /** The other way of settling, where there is steel. */
  alternative?: { rule: "adiabatic" | "with-steel"; pressurePa: number; temperatureK: number };
  restAtTemperatureK?: number;
};

/** The section closed in after the blowdown, warming up in its surroundings. */
export type Afterwards = {
  /** What was not given, and what stands in for it. */
  assumed: string[];
  surroundings: { temperatureK: number; coefficientWPerM2K: number };
  /** Times from the end of the run, with a band of half of it either way. Absent without a wall and its rated temperature. */
  rewarm?: {
    state: "already-above" | "rewarms" | "never";
    ratedTemperatureK: number;
    coldestAtStopK: number;
    /** The steel goes on cooling while the cold fluid evens out with it. */
    coldestAfterwardsK: number;
    timeS?: number;
    lowS?: number;
    highS?: number;
  };
  closedIn: {
    temperatureK: number;
    pressurePa: number;
    /** The pressure at `bandK` less and more. */
    bandK: number;
    lowPa: number;
    highPa: number;
    vapourMoleFraction: number;
    /** Where a design pressure is given: is the upper end above it? */
    aboveDesign?: boolean;
  };
};

export type SteelInFireItem = {
  id: string;
  name: string;
  steel: string;
  part: "dry" | "wet";
  insideDiameterM: number;
  thicknessM: number;
  /** Hot strength over stress, at its least while the blowdown runs. */
  leastRatio: number;
  leastRatioTimeS: number;
  hottestWallK: number;
  /** Absent: not within the time looked at. */
  ruptureTimeS?: number;
  ruptureTimeAtMoreFluxS?: number;
  ruptureTimeShutInS?: number;
  timeTo400CelsiusS?: number;
  verdict: Verdict;
  governs: boolean;
  series: { timeS: number[]; wallTemperatureK: number[]; stressPa: number[]; strengthPa: number[] };
};

/** The same fire with every valve shut until a delay. */
export type LateOpening =
  | { delayS: number; itemId: string; leastRatio: number; verdict: Verdict; ruptureTimeS?: number }
  | { delayS: number; refused: string };

/** Steel in the flames against the falling pressure. */
export type SteelInFire = {
  fire: { basis: "open-pool" | "confined-pool" | "jet"; initialFluxWPerM2: number; fixedFluxWPerM2?: number };
  strengthFraction: number;
  /** Time looked at, from the start of fire and blowdown. */
  horizonS: number;
  /** Pressure held in the comparison without blowdown. */
  shutInPressurePa: number;
  items: SteelInFireItem[];
  depressurisationWins: boolean;
  /** Where the case asks for delays. */
  late?: LateOpening[];
  verdict: Verdict;
  sentence: string;
};

export type Warning = { code: string; message: string };

export type BlowdownResult = {
  format: "ebbmark-result/1";
  kind: "blowdown";
  engineVersion: string;
  caseSha256: string;
  summary: BlowdownSummary;
  series: BlowdownSeries;
  energyAccount: EnergyAccount;
  /** Where several vessels were joined. */
  settleOut?: SettleOutReport;
  afterwards?: Afterwards;
  /** Where a wall stands in a fire. */
  steelInFire?: SteelInFire;
  verdict: Verdict;
  /** In the order of the form; the one with the least in hand governs. */
  limits: AssessedLimit[];
  warnings: Warning[];
  /** The words; `cautionIds` names them in the same order. */
  cautions: string[];
  cautionIds: string[];
  numerics: { relativeTolerance: number; steps: number; evaluations: number; wallClockMs: number };
};

/** The run again at a tenfold tighter tolerance, and how far the governing figures moved. */
export type Confirmation = {
  relativeTolerance: number;
  figures: { id: string; title: string; unit: string; value: number; confirmed: number; change: number }[];
  result: BlowdownResult;
};
