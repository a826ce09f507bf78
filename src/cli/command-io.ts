/** What a command may touch: the two streams and a few facts of the program. The process itself stays in main.ts. */
export interface CommandIo {
  /** Result, to standard output or the file of --output. */
  readonly out: (text: string) => void;
  /** Everything else, to standard error. */
  readonly err: (text: string) => void;
  readonly program: {
    readonly version: string;
    /** Day of the release, ISO 8601. */
    readonly date: string;
  };
  /** Keys of the catalogue, read at the first call. */
  readonly catalogueKeys: () => readonly string[];
}
