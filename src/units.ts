/**
 * Named quantities. Plain aliases say what a number is; branded types are used where two could be
 * mistaken for each other and the mistake would be silent.
 */

declare const brand: unique symbol;
type Branded<Name extends string> = number & { readonly [brand]: Name };

/** Frequency in cycles per second. */
export type Hertz = number;
/** Resistance in ohms. */
export type Ohms = number;
/** Capacitance in farads. */
export type Farads = number;
/** Inductance in henries. */
export type Henries = number;
/** Transconductance in siemens (amperes per volt). */
export type Siemens = number;
/** Electrical potential in volts. */
export type Volts = number;
/** Current in amperes. */
export type Amperes = number;
/** Power in watts. */
export type Watts = number;
/** Duration in seconds. */
export type Seconds = number;
/** A level or gain in decibels. */
export type Decibels = number;
/** Loudness in LUFS (loudness units relative to full scale, ITU-R BS.1770). */
export type Lufs = number;
/** An angle in degrees. */
export type Degrees = number;

/** Angular frequency in radians per second; never to be mixed with {@link Hertz}. */
export type RadiansPerSecond = Branded<'RadiansPerSecond'>;
/**
 * Mechanical position of a potentiometer, 0 (fully anticlockwise) to 1 (fully clockwise).
 * A taper turns it into a {@link TrackRatio}.
 */
export type Rotation = Branded<'Rotation'>;
/** Share of a potentiometer's track between the anticlockwise end and the wiper, 0 to 1. */
export type TrackRatio = Branded<'TrackRatio'>;

/** What a part value is measured in. `ratio` is a pure number. */
export type UnitSymbol = 'Ω' | 'F' | 'H' | 'S' | 'V' | 'A' | 'W' | 'ratio';

/** Radians per second of a frequency in hertz. */
export function radiansPerSecond(frequency: Hertz): RadiansPerSecond {
  return (2 * Math.PI * frequency) as RadiansPerSecond;
}

/** Brands a number between 0 and 1 as a rotation, clamping it to the ends of travel; NaN becomes 0. */
export function rotation(value: number): Rotation {
  return (value > 0 ? Math.min(value, 1) : 0) as Rotation;
}

/** Level in dB of an amplitude ratio; 0 gives −Infinity. */
export function decibels(amplitude: number): Decibels {
  return 20 * Math.log10(Math.abs(amplitude));
}

/** Amplitude ratio of a level in dB. */
export function amplitude(level: Decibels): number {
  return 10 ** (level / 20);
}
