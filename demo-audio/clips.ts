/** A demo clip: what it is called, what it is good for, and where it lies. */
export interface DemoClip {
  readonly id: string;
  readonly title: string;
  readonly description: string;
  readonly url: string;
}

/** The clips that come with the program, synthesised by `make.mjs`; the first is loaded at start. */
export const DEMO_CLIPS: readonly DemoClip[] = [
  {
    id: 'ringing-chords',
    title: 'Ringing chords',
    description: 'full chords left to ring: hear the balance of bass, dip and treble',
    url: new URL('./ringing-chords.wav', import.meta.url).href,
  },
  {
    id: 'single-notes',
    title: 'Single notes',
    description: 'a melody, one string at a time: hear the upper middle and the presence',
    url: new URL('./single-notes.wav', import.meta.url).href,
  },
  {
    id: 'damped-lows',
    title: 'Damped low strings',
    description: 'short low notes: hear how tight the bass is',
    url: new URL('./damped-lows.wav', import.meta.url).href,
  },
];
