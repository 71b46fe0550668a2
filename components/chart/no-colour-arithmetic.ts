/**
 * Stands in for the colour arithmetic that Chart.js brings along for hovering and animated colours.
 * Neither is used here (no events, no animation), and the first screen is 5 kB lighter without it.
 */
export class Color {
  readonly value: unknown;

  constructor(value: unknown) {
    this.value = value;
  }

  /** Chart.js asks before it mixes; nothing here can be mixed. */
  get valid(): boolean {
    return false;
  }

  saturate(): this {
    return this;
  }

  darken(): this {
    return this;
  }

  hexString(): unknown {
    return this.value;
  }

  rgbString(): unknown {
    return this.value;
  }
}
