/**
 * A plucked string after K. Karplus and A. Strong, Computer Music Journal 7(2), 1983, pp. 43–55, with
 * the extensions of D. A. Jaffe and J. O. Smith in the same issue, pp. 56–69 (from memory): tuning by
 * an all-pass, decay time set by a loss factor, pick position by a comb, dynamics by a low-pass.
 */

/** Even numbers in [−1, 1) from a seed, the same everywhere (mulberry32, public domain, from memory). */
export function noise(seed) {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 31 - 1;
  };
}

/**
 * One note added to `out`.
 *
 * @param out samples, 48 kHz.
 * @param start first sample. @param length samples, a short release at the end included.
 * @param note.frequency hertz, or a function of seconds since the pluck (a bend).
 * @param note.decay seconds for the fundamental to fall by 60 dB.
 * @param note.bright 0 to 1: share of the loop's averaging that is left out.
 * @param note.pick where it is plucked, as a share of the string from the bridge.
 * @param note.force 0 to 1; a softer pluck is darker. @param note.seed seed of the noise.
 */
export function pluck(out, rate, start, length, note) {
  const { decay, bright, pick, force, seed } = note;
  const pitch = typeof note.frequency === 'function' ? note.frequency : () => note.frequency;
  const random = noise(seed);
  const longest = Math.ceil(rate / Math.min(pitch(0), pitch(length / rate))) + 4;
  const ring = new Float64Array(longest);
  const period = rate / pitch(0);

  // Excitation: a burst of noise, softened by the force, combed by the pick position.
  const burst = new Float64Array(Math.ceil(period));
  let soft = 0;
  const softness = 0.94 - 0.16 * force;
  for (let index = 0; index < burst.length; index += 1) {
    soft = (1 - softness) * random() + softness * soft;
    burst[index] = soft;
  }
  const comb = Math.max(1, Math.round(pick * period));
  const mean = burst.reduce((sum, value) => sum + value, 0) / burst.length;
  for (let index = burst.length - 1; index >= 0; index -= 1) {
    burst[index] = burst[index] - mean - (index >= comb ? burst[index - comb] - mean : 0);
  }

  const release = Math.min(Math.round(0.03 * rate), length);
  let write = 0;
  let lastAveraged = 0;
  for (let frame = 0; frame < length && start + frame < out.length; frame += 1) {
    const frequency = pitch(frame / rate);
    // Loop delay: the ring plus half a sample of the averaging filter, read between samples.
    const delay = rate / frequency - 0.5 * (1 - bright);
    const place = write - delay + longest * 4;
    const whole = Math.floor(place);
    const share = place - whole;
    const at = (index) => ring[((index % longest) + longest) % longest];
    // Third-order Lagrange interpolation keeps the tuning without damping the treble as linear would.
    const [a, b, c, d] = [at(whole - 1), at(whole), at(whole + 1), at(whole + 2)];
    const read =
      (-share * (share - 1) * (share - 2) * a) / 6 +
      ((share + 1) * (share - 1) * (share - 2) * b) / 2 -
      ((share + 1) * share * (share - 2) * c) / 2 +
      ((share + 1) * share * (share - 1) * d) / 6;
    const loss = 10 ** (-3 / (frequency * decay));
    const mix = 0.5 * (1 - bright);
    const averaged = loss * ((1 - mix) * read + mix * lastAveraged);
    lastAveraged = read;
    const sample = averaged + (frame < burst.length ? burst[frame] * force : 0);
    ring[write % longest] = sample;
    write += 1;
    const fade =
      frame >= length - release ? 0.5 + 0.5 * Math.cos((Math.PI * (frame - length + release)) / release) : 1;
    out[start + frame] += fade * sample;
  }
}
