import { type ResultType, Simulation } from 'eecircuit-engine';

/** What a SPICE program finds at one node, for a source of 1 V and phase 0. */
export interface AcRun {
  readonly frequencies: readonly number[];
  /** Level in dB. */
  readonly levels: readonly number[];
  /** Phase in degrees, −180 to 180. */
  readonly phases: readonly number[];
}

/** The sweep: SPICE's own logarithmic grid. */
export interface AcSweep {
  readonly from: number;
  readonly to: number;
  readonly perDecade: number;
}

let starting: Promise<Simulation> | undefined;

async function started(): Promise<Simulation> {
  const simulation = new Simulation();
  await simulation.start();
  return simulation;
}

/** The netlist with its own analysis and print lines replaced by the sweep asked for. */
function withSweep(netlist: string, { from, to, perDecade }: AcSweep): string {
  const kept = netlist.split('\n').filter((line) => !/^\s*\.(ac|print|end)\b/i.test(line));
  // A linear circuit needs no operating point, and inductors in a ring have none that SPICE can find.
  return [...kept, '.options noopac', `.ac dec ${perDecade} ${from} ${to}`, '.end', ''].join('\n');
}

/** One node's voltage out of a run, by its lower-case name. */
function read(result: ResultType, node: string): AcRun {
  if (result.dataType !== 'complex') throw new Error(`the run gave ${result.dataType} data`);
  const column = (name: string) => {
    const found = result.data.find((entry) => entry.name.toLowerCase() === name);
    if (found === undefined) throw new Error(`no ${name}; there are ${result.variableNames.join(', ')}`);
    return found.values;
  };
  const voltages = column(`v(${node})`);
  return {
    frequencies: column('frequency').map((value) => value.real),
    levels: voltages.map(({ real, img }) => 20 * Math.log10(Math.hypot(real, img))),
    phases: voltages.map(({ real, img }) => (Math.atan2(img, real) * 180) / Math.PI),
  };
}

/**
 * Runs a netlist in a SPICE engine compiled to WebAssembly (npm `eecircuit-engine`), another program
 * by other people, and reads the AC voltage of one node. The engine starts once, in half a second.
 *
 * @throws Error with the engine's own messages where it refuses the netlist.
 */
export async function runAc(netlist: string, node: string, sweep: AcSweep): Promise<AcRun> {
  starting ??= started();
  const simulation = await starting;
  simulation.setNetList(withSweep(netlist, sweep));
  const result = await simulation.runSim();
  const problems = simulation.getError();
  if (problems.length > 0) throw new Error(problems.join('\n'));
  return read(result, node.toLowerCase());
}
