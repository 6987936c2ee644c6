/** A doubt that stands beside a result. Codes are stable; the message is the sentence a person reads. */
export interface Warning {
  code: string;
  message: string;
}
