import { messageOf, NotchworkError } from '../errors.ts';
import { readArguments, usageError } from './arguments.ts';
import type { Command } from './command.ts';
import { coefficientsCommand } from './commands/coefficients.ts';
import { curveCommand } from './commands/curve.ts';
import { renderCommand } from './commands/render.ts';
import { sheetCommand } from './commands/sheet.ts';

const COMMANDS: readonly Command[] = [curveCommand, coefficientsCommand, renderCommand, sheetCommand];

const OVERVIEW = [
  'Usage: npm run --silent cli -- COMMAND FILE … [OPTIONS]',
  '',
  ...COMMANDS.map((command) => `  ${command.name.padEnd(14)}${command.summary}`),
  '',
  'FILE is a design (.json) or a SPICE netlist (.cir). Data goes to standard output, messages to',
  'standard error. Exit code 0: done; 1: the input is wrong; 2: the call is wrong.',
  'COMMAND --help tells the options of a command.',
  '',
].join('\n');

function helpOf(command: Command): string {
  const options = command.options.map((option) => {
    const left = `  --${option.name}${option.value === undefined ? '' : ` ${option.value}`}`;
    return `${left.padEnd(24)}${option.help}`;
  });
  return [
    `Usage: npm run --silent cli -- ${command.name} ${command.files.join(' ')} [OPTIONS]`,
    '',
    command.summary,
    '',
    ...options,
    '',
    ...command.notes,
    '',
  ].join('\n');
}

/** Runs a command to the end; usage mistakes are thrown as `usage` errors. */
async function run(args: readonly string[]): Promise<void> {
  const [name, ...rest] = args;
  if (name === undefined) throw usageError('No command was given.');
  if (name === '--help' || name === '-h' || name === 'help') {
    process.stdout.write(OVERVIEW);
    return;
  }
  const command = COMMANDS.find((entry) => entry.name === name);
  if (command === undefined) {
    throw usageError(
      `There is no command “${name}”; there are ${COMMANDS.map((entry) => entry.name).join(', ')}.`,
    );
  }
  if (rest.includes('--help') || rest.includes('-h')) {
    process.stdout.write(helpOf(command));
    return;
  }
  await command.run(readArguments(rest, command.options, command.files));
}

/**
 * The command line: `args` without Node and script.
 *
 * @returns the exit code: 0 done, 1 the input is wrong, 2 the call is wrong.
 */
export async function main(args: readonly string[]): Promise<number> {
  try {
    await run(args);
    return 0;
  } catch (error) {
    const isUsage = error instanceof NotchworkError && error.code === 'usage';
    process.stderr.write(`${messageOf(error)}\n`);
    if (isUsage) process.stderr.write('Add --help for what can be called.\n');
    if (!(error instanceof NotchworkError)) {
      process.stderr.write(
        'This is a fault of the program, not of the input; please report it with the file.\n',
      );
    }
    return isUsage ? 2 : 1;
  }
}
