const FIRST_LENGTH = 65_536;

/** Instants and voltages of which nobody knows beforehand how many will come. */
export class GrowingSamples {
  private instants = new Float64Array(FIRST_LENGTH);
  private voltages = new Float32Array(FIRST_LENGTH);
  count = 0;
  /** The latest instant. */
  last = -Infinity;

  add(seconds: number, volts: number): void {
    if (this.count === this.instants.length) this.grow();
    this.instants[this.count] = seconds;
    this.voltages[this.count] = volts;
    this.count += 1;
    this.last = seconds;
  }

  get seconds(): Float64Array {
    return this.instants.subarray(0, this.count);
  }

  get volts(): Float32Array {
    return this.voltages.subarray(0, this.count);
  }

  private grow(): void {
    const instants = new Float64Array(this.count * 2);
    instants.set(this.instants);
    this.instants = instants;
    const voltages = new Float32Array(this.count * 2);
    voltages.set(this.voltages);
    this.voltages = voltages;
  }
}
