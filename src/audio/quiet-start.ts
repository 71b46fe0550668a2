/** Keeps the sound library from announcing itself on the console; imported before it. */
Object.assign(globalThis, { TONE_SILENCE_LOGGING: true });
