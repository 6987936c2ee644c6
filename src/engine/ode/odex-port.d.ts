/** What `integrate.ts` uses of odex 2.0.4 (Hairer and Wanner's extrapolation code), with the shapes it really has. */
export declare enum Outcome {
  Converged = 0,
  MaxStepsExceeded = 1,
  EarlyReturn = 2,
}

export declare class Solver {
  constructor(dimension: number);
  absoluteTolerance: number | number[];
  relativeTolerance: number | number[];
  initialStepSize: number;
  maxStepSize: number;
  maxSteps: number;
  denseOutput: boolean;
  /** `dense` is absent in the first call and valid only inside the call that hands it over. Returning false stops. */
  solve(
    f: (x: number, y: number[]) => ArrayLike<number>,
    x0: number,
    y0: number[],
    xEnd: number,
    out?: (nr: number, xOld: number, x: number, y: number[], dense?: (component: number, x: number) => number) => boolean | void,
  ): { y: number[]; outcome: Outcome; nStep: number; xEnd: number; nAccept: number; nReject: number; nEval: number };
}
