const lone = /[\uD800-\uDBFF](?![\uDC00-\uDFFF])|(?<![\uD800-\uDBFF])[\uDC00-\uDFFF]/;
const control = /[\u0000-\u0008\u000b-\u001f\u007f]/;
const turning = /[\u202a-\u202e\u2066-\u2069]/;

/**
 * Why a text may not stand in a record, or undefined when it may.
 *
 * Marks that turn the reading direction are refused because they make a line read otherwise than it is; texts not in normal form C because
 * two of them can look alike and differ in their bytes (RFC 8785 does not normalise).
 */
export function faultOfText(text: string): string | undefined {
  if (lone.test(text)) return "holds half a surrogate pair";
  if (control.test(text)) return "holds a control character";
  if (turning.test(text)) return "holds a mark that turns the reading direction";
  if (text.normalize("NFC") !== text) return "is not in Unicode normal form C";
  return undefined;
}
