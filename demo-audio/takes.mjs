import { noise, pluck } from './plucked-string.mjs';

/**
 * Three takes of an invented band, the Lanternfish Quartet, as if recorded dry in an attic: nobody's
 * recording, every sample computed here.
 */

export const RATE = 48_000;

/** Frequency of a MIDI note number in equal temperament, A4 = 440 Hz (ISO 16). */
const hertz = (note) => 440 * 2 ** ((note - 69) / 12);

/** Six chords let ring, one string after the other. */
function ringingChords() {
  const seconds = 8;
  const out = new Float64Array(seconds * RATE);
  const random = noise(101);
  const chords = [
    [40, 47, 52, 56, 59, 64],
    [45, 52, 57, 61, 64],
    [42, 49, 54, 57, 61, 66],
    [47, 54, 59, 62, 66],
    [40, 47, 52, 56, 59, 64],
  ];
  chords.forEach((chord, index) => {
    const begin = 0.05 + index * 1.58 + 0.01 * random();
    chord.forEach((note, string) => {
      const start = Math.round((begin + string * 0.014 + 0.002 * random()) * RATE);
      const end = Math.round(Math.min(begin + 1.62, seconds - 0.02) * RATE);
      pluck(out, RATE, start, end - start, {
        frequency: hertz(note),
        decay: 5.5 - 0.4 * string,
        bright: 0.2,
        pick: 0.13,
        force: 0.8 + 0.12 * random(),
        seed: 1000 + 10 * index + string,
      });
    });
  });
  return out;
}

/** A melody on one string at a time, with a bend and some vibrato. */
function singleNotes() {
  const seconds = 9;
  const out = new Float64Array(seconds * RATE);
  const random = noise(202);
  const steps = [
    [64, 0.5],
    [67, 0.5],
    [69, 1],
    [71, 0.5],
    [69, 0.5],
    [67, 0.75],
    [64, 0.25],
    [62, 0.5],
    [64, 1.5],
    [71, 0.5],
    [74, 0.5],
    [76, 1],
    [74, 0.5],
    [71, 0.5],
    [69, 1.5],
  ];
  const beat = 0.72;
  let time = 0.05;
  steps.forEach(([note, beats], index) => {
    const length = beats * beat;
    const start = Math.round((time + 0.006 * random()) * RATE);
    const isLong = beats >= 1;
    const frequency = isLong
      ? (seconds2) => {
          const bend = index === 2 || index === 11 ? Math.max(0, 1 - seconds2 / 0.18) : 0; // arrives from a tone below
          const vibrato = 0.18 * Math.min(1, seconds2 / 0.6) * Math.sin(2 * Math.PI * 5.3 * seconds2);
          return hertz(note - 2 * bend * bend + vibrato);
        }
      : hertz(note);
    const frames = Math.min(
      Math.round((length + 0.015) * RATE),
      out.length - Math.round(0.02 * RATE) - start,
    );
    pluck(out, RATE, start, frames, {
      frequency,
      decay: 4,
      bright: 0.15,
      pick: 0.18,
      force: 0.82 + 0.1 * random(),
      seed: 2000 + index,
    });
    time += length;
  });
  return out;
}

/** Low strings damped by the palm, a steady figure in eighths. */
function dampedLows() {
  const seconds = 8;
  const out = new Float64Array(seconds * RATE);
  const random = noise(303);
  const eighth = 0.2;
  const figure = [40, 40, 52, 40, 40, 50, 40, 47, 40, 40, 52, 40, 55, 52, 50, 47];
  for (let index = 0; index * eighth < seconds - 0.3; index += 1) {
    const note = figure[index % figure.length];
    const accent = index % 4 === 0;
    const start = Math.round((0.05 + index * eighth + 0.003 * random()) * RATE);
    const length = Math.round((accent ? 0.19 : 0.16) * RATE);
    for (const [offset, force] of accent
      ? [
          [0, 0.9],
          [7, 0.75],
        ]
      : [[0, 0.82]]) {
      pluck(out, RATE, start, length, {
        frequency: hertz(note + offset),
        decay: accent ? 0.7 : 0.34,
        bright: 0,
        pick: 0.09,
        force: force + 0.06 * random(),
        seed: 3000 + 3 * index + offset,
      });
    }
  }
  return out;
}

/**
 * What a pickup and its cable do: a comb for its place along the string is in the pluck already; here
 * a resonant second-order low-pass (common practice, no source: near 3.5 kHz, a few dB), then a
 * one-pole high-pass at 30 Hz that takes the direct component out.
 */
function pickup(signal) {
  const cutoff = 3500;
  const quality = 1.6;
  const omega = (2 * Math.PI * cutoff) / RATE;
  const alpha = Math.sin(omega) / (2 * quality);
  const cosine = Math.cos(omega);
  const b0 = (1 - cosine) / 2 / (1 + alpha);
  const a1 = (-2 * cosine) / (1 + alpha);
  const a2 = (1 - alpha) / (1 + alpha);
  let [x1, x2, y1, y2, held, before] = [0, 0, 0, 0, 0, 0];
  const keep = Math.exp((-2 * Math.PI * 30) / RATE);
  return signal.map((x) => {
    const y = b0 * (x + 2 * x1 + x2) - a1 * y1 - a2 * y2;
    [x2, x1, y2, y1] = [x1, x, y1, y];
    held = y - before + keep * held;
    before = y;
    return held;
  });
}

/** Peak to −3 dBFS, then 16-bit steps. */
function toSteps(signal) {
  const peak = signal.reduce((highest, value) => Math.max(highest, Math.abs(value)), 0);
  const gain = 10 ** (-3 / 20) / peak;
  return Int16Array.from(signal, (value) => Math.round(value * gain * 32767));
}

/** Every take: file name and samples. */
export const TAKES = [
  { file: 'ringing-chords.wav', make: () => toSteps(pickup(ringingChords())) },
  { file: 'single-notes.wav', make: () => toSteps(pickup(singleNotes())) },
  { file: 'damped-lows.wav', make: () => toSteps(pickup(dampedLows())) },
];
