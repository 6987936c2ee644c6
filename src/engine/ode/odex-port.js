// The only file that imports the solver. Types are written by hand beside it: the package ships sources that fail strict settings.
export { Outcome, Solver } from "odex";
