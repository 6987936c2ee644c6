import { endpoints } from "@/contracts/paths";
import type { Preferences } from "@/contracts/requests";
import { putJson } from "./fetch-json";

/**
 * Keeps a choice of appearance with the person, for the next browser. This browser holds it in a cookie already, so nothing is said when it
 * can't be kept.
 */
export function rememberChoice(choice: Preferences): void {
  putJson(endpoints.preferences, choice).catch(() => undefined);
}
