import { LINEAR } from '../parts/taper.ts';
import { rotation } from '../units.ts';
import type { Block, BlockElement, BlockSettings } from './block.ts';

/** The part of the tail that sets the feedback at low frequencies, in ohms. */
function tailResistance(settings: BlockSettings): number {
  const across = settings.choices['presenceCircuit'] === 'across-tail';
  return settings.parts[across ? 'tailResistor' : 'presencePot']!;
}

/** Feedback in dB where the presence capacitor does nothing: `20·log(1 + A·β)` of the resistive loop. */
export function resistiveFeedback(settings: BlockSettings): number {
  const part = (name: string): number => settings.parts[name]!;
  const tail = tailResistance(settings);
  const path = part('feedbackResistor') + tail;
  const load = (part('loadResistance') * path) / (part('loadResistance') + path);
  const forward = (part('gain') * load) / (load + part('sourceImpedance'));
  return 20 * Math.log10(1 + (forward * tail) / path);
}

/**
 * A power stage reduced to what its feedback needs: a differencing amplifier of gain A with a source
 * impedance and a resistive load, the output fed back through a resistor to its tail.
 *
 * Presence takes treble out of the feedback, so that the gain rises towards its open-loop value
 * there. Two usual circuits: the control is the tail, with a capacitor from its wiper to ground; or
 * a fixed tail has the capacitor and a variable resistor in series across it.
 * (H. S. Black, Bell System Technical Journal 13, 1934: gain with feedback is A/(1 + Aβ).)
 */
export const powerFeedback: Block = {
  slot: 'power',
  variant: 'feedback',
  title: 'Gain and feedback',
  summary: 'A power stage as a gain with feedback: enough to hear what the presence control does.',
  input: 'grid',
  parts: {
    gain: {
      label: 'Forward gain',
      short: 'Gain',
      designator: 'A',
      kind: 'quantity',
      unit: 'ratio',
      fallback: 60,
      range: [0, 1e5],
      help: 'From the grid to the output without feedback. Raise it and there is more feedback, and more for presence to take away.',
    },
    sourceImpedance: {
      label: 'Source impedance',
      short: 'Output Z',
      designator: 'RO',
      kind: 'quantity',
      unit: 'Ω',
      fallback: 40,
      range: [0, 1e5],
      help: 'Of the output stage without feedback, at the output. Raise it and the load takes more of the gain.',
    },
    loadResistance: {
      label: 'Load',
      short: 'Load',
      designator: 'RL',
      kind: 'quantity',
      unit: 'Ω',
      fallback: 8,
      range: [0.1, 1e6],
      help: 'The loudspeaker as a plain resistance. Raise it and the stage has more gain, and so more feedback.',
    },
    feedbackResistor: {
      label: 'Feedback resistor',
      short: 'Feedback',
      designator: 'R2',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 27e3,
      range: [100, 10e6],
      help: 'Raise it and there is less feedback: louder, rounder, and less for presence to do.',
    },
    presencePot: {
      label: 'Presence potentiometer',
      short: 'Presence pot',
      designator: 'VR4',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 4700,
      range: [100, 1e6],
      help: 'As the tail, raise it and there is more feedback; across the tail, raise it and the control starts from less.',
    },
    tailResistor: {
      label: 'Tail resistor',
      short: 'Tail',
      designator: 'R3',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 4700,
      range: [10, 1e6],
      help: 'Raise it and there is more feedback.',
    },
    presenceCap: {
      label: 'Presence capacitor',
      short: 'Presence cap',
      designator: 'C4',
      kind: 'capacitor',
      unit: 'F',
      fallback: 100e-9,
      range: [1e-12, 1e-4],
      help: 'Raise it and the lift begins at a lower frequency.',
    },
  },
  knobs: {
    presence: {
      label: 'Presence',
      part: 'presencePot',
      fallback: rotation(0.4),
      taper: LINEAR,
      help: 'Takes treble out of the feedback: turned up, the amplifier gets brighter.',
    },
  },
  choices: {
    presenceCircuit: {
      label: 'Presence circuit',
      options: [
        { value: 'tail-pot', label: 'potentiometer as the tail, capacitor from its wiper' },
        { value: 'across-tail', label: 'capacitor and variable resistor across a fixed tail' },
      ],
      fallback: 'tail-pot',
      help: 'Both shunt the treble of the feedback to ground; they differ in how the effect is spread over the turn.',
    },
  },
  referenceKnobs: { presence: rotation(0) },
  elements(settings, neighbours) {
    const tail: readonly BlockElement[] =
      settings.choices['presenceCircuit'] === 'across-tail'
        ? [
            { kind: 'resistor', name: 'tailResistor', nodes: ['tail', '0'], value: { part: 'tailResistor' } },
            {
              kind: 'capacitor',
              name: 'presenceCap',
              nodes: ['tail', 'lift'],
              value: { part: 'presenceCap' },
            },
            {
              kind: 'resistor',
              name: 'presence',
              nodes: ['lift', '0'],
              value: { knob: 'presence', side: 'upper' },
            },
          ]
        : [
            {
              kind: 'resistor',
              name: 'presenceUpper',
              nodes: ['tail', 'wiper'],
              value: { knob: 'presence', side: 'upper' },
            },
            {
              kind: 'resistor',
              name: 'presenceLower',
              nodes: ['wiper', '0'],
              value: { knob: 'presence', side: 'lower' },
            },
            { kind: 'capacitor', name: 'presenceCap', nodes: ['wiper', '0'], value: { part: 'presenceCap' } },
          ];
    // The speaker's block, where it is in the line, is the load instead.
    const load: readonly BlockElement[] =
      neighbours.after?.slot === 'speaker'
        ? []
        : [
            {
              kind: 'resistor',
              name: 'loadResistance',
              nodes: ['out', '0'],
              value: { part: 'loadResistance' },
            },
          ];
    return [
      {
        kind: 'voltage-gain',
        name: 'gain',
        nodes: ['plate', '0'],
        control: ['in', 'tail'],
        value: { part: 'gain' },
      },
      {
        kind: 'resistor',
        name: 'sourceImpedance',
        nodes: ['plate', 'out'],
        value: { part: 'sourceImpedance' },
      },
      ...load,
      {
        kind: 'resistor',
        name: 'feedbackResistor',
        nodes: ['out', 'tail'],
        value: { part: 'feedbackResistor' },
      },
      ...tail,
    ];
  },
  describe: (settings) => `feedback ${resistiveFeedback(settings).toFixed(1)} dB`,
};
