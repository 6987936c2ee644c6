/** A reason the database can't be brought to where the program needs it, in one line that says what to do. */
export class MigrationFailure extends Error {
  override name = "MigrationFailure";
}
