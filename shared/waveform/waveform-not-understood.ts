/** A file that is no waveform. Its message is a sentence for the person who chose the file. */
export class WaveformNotUnderstood extends RangeError {
  override readonly name = 'WaveformNotUnderstood';

  constructor(
    message: string,
    /** Number of the row at fault as an editor counts it, where one is. */
    readonly row: number | null = null,
  ) {
    super(row === null ? message : `Row ${row}: ${message}`);
  }
}
