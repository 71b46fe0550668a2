/** The part of the package `fft.js` that is used; it ships no types of its own. */
declare module 'fft.js' {
  export default class FFT {
    constructor(size: number);
    createComplexArray(): number[];
    realTransform(output: number[], input: ArrayLike<number>): void;
    completeSpectrum(spectrum: number[]): void;
    inverseTransform(output: number[], input: ArrayLike<number>): void;
  }
}
