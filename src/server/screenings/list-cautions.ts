import "server-only";
import { screeningCaution } from "@/engine/cautions";

/** What stands beside verdicts in a list, where the cautions of each record are one request away. */
export const listCautions: readonly string[] = [screeningCaution.words];
