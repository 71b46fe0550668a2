import { Simulation } from 'eecircuit-engine';
import type { Wiring } from '../../src/circuit/wiring.ts';

/** What a SPICE engine says of one node against frequency. */
export interface SpiceResponse {
  readonly frequencies: readonly number[];
  readonly re: readonly number[];
  readonly im: readonly number[];
}

/** SPICE takes no resistor of 0 Ω; a milliohm is as good as none next to kilohms. */
const SHORT = 1e-3;

/** A wiring with its values as the text of a SPICE netlist; numbers with all their digits. */
export function spiceText(wiring: Wiring, values: ArrayLike<number>, sweep: string): string {
  const lines = wiring.elements.map((element, index) => {
    const value = values[index]!;
    const nodes = [...element.nodes, ...('control' in element ? element.control : [])]
      .map(plainNode)
      .join(' ');
    const letter = {
      resistor: 'R',
      capacitor: 'C',
      inductor: 'L',
      transconductance: 'G',
      'voltage-gain': 'E',
    }[element.kind];
    const written = element.kind === 'resistor' ? Math.max(value, SHORT) : value;
    return `${letter}${index} ${nodes} ${written.toExponential(16)}`;
  });
  const source = wiring.source.map(plainNode).join(' ');
  return ['check', `Vin ${source} DC 0 AC 1`, ...lines, sweep, '.end'].join('\n');
}

/** Node names that every SPICE takes. */
export function plainNode(name: string): string {
  return name === '0' ? '0' : `n_${name.replace(/[^a-z0-9]/gi, '_').toLowerCase()}`;
}

let simulation: Promise<Simulation> | undefined;

async function started(): Promise<Simulation> {
  simulation ??= (async () => {
    const fresh = new Simulation();
    await fresh.start();
    return fresh;
  })();
  return simulation;
}

/** Runs a netlist in `eecircuit-engine`, a SPICE engine from the npm registry, and reads one voltage. */
export async function runSpice(text: string, node: string): Promise<SpiceResponse> {
  const engine = await started();
  engine.setNetList(text);
  const result = await engine.runSim();
  if (result.dataType !== 'complex') throw new Error(`the engine gave no AC result: ${text}`);
  const frequency = result.data.find((entry) => entry.type === 'frequency');
  const voltage = result.data.find((entry) => entry.name.toLowerCase() === `v(${plainNode(node)})`);
  if (frequency === undefined || voltage === undefined) {
    throw new Error(`the engine does not know ${node}: ${result.variableNames.join(', ')}`);
  }
  return {
    frequencies: frequency.values.map((value) => value.real),
    re: voltage.values.map((value) => value.real),
    im: voltage.values.map((value) => value.img),
  };
}
