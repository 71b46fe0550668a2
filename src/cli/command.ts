import type { CommandArguments, OptionSpec } from './arguments.ts';

/** One command of the terminal. */
export interface Command {
  readonly name: string;
  readonly summary: string;
  /** Names of the files it takes, in order: "FILE", "IN.wav". */
  readonly files: readonly string[];
  readonly options: readonly OptionSpec[];
  /** Lines under the options in its help. */
  readonly notes: readonly string[];
  /** Does the work; throws NotchworkError where the input is wrong. */
  run(args: CommandArguments): Promise<void>;
}

/** Options that every command with knobs takes. */
export const KNOB_OPTION: OptionSpec = {
  name: 'knob',
  value: 'NAME=0..1',
  multiple: true,
  help: 'position of a knob, 0 to 1; may be given several times',
};

/** The option that names another output node. */
export const OUTPUT_OPTION: OptionSpec = {
  name: 'output',
  value: 'NODE',
  help: 'output node of a netlist (default out), or a block of a design',
};
