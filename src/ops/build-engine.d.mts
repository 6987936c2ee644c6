/** Absolute path of the checkout. */
export declare const root: string;
export declare function enginesFolder(): string;
/** Builds the engine into the folder if its sources changed. `file` is absolute. */
export declare function buildEngine(folder?: string): Promise<{ file: string; engineVersion: string }>;
