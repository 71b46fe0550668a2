import { parseArgs } from 'node:util';
import { NotchworkError } from '../errors.ts';

/** Options that a command may take; each is read by name from {@link CommandArguments}. */
export interface OptionSpec {
  readonly name: string;
  /** Placeholder of the value in the help, as "HZ"; a flag has none. */
  readonly value?: string;
  readonly multiple?: boolean;
  readonly help: string;
}

/** What was typed after the command's name, checked against its options. */
export interface CommandArguments {
  readonly positionals: readonly string[];
  text(name: string): string | undefined;
  texts(name: string): readonly string[];
  flag(name: string): boolean;
  /** A number within a range, or the fallback where the option was not given. */
  number(name: string, fallback: number, min: number, max: number): number;
}

/** A mistake in the call itself: exit code 2. */
export function usageError(message: string): NotchworkError {
  return new NotchworkError('usage', message);
}

function readNumber(option: string, text: string, min: number, max: number): number {
  const value = text.trim() === '' ? Number.NaN : Number(text);
  if (!(value >= min && value <= max)) {
    throw usageError(`--${option} is “${text}”; it takes a number from ${min} to ${max}.`);
  }
  return value;
}

/**
 * Reads the arguments of a command.
 *
 * @throws NotchworkError `usage` for an unknown option, a missing value or a wrong count of files.
 */
export function readArguments(
  args: readonly string[],
  options: readonly OptionSpec[],
  files: readonly string[],
): CommandArguments {
  let parsed: ReturnType<typeof parseArgs>;
  try {
    parsed = parseArgs({
      args: [...args],
      allowPositionals: true,
      strict: true,
      options: Object.fromEntries(
        options.map((option) => [
          option.name,
          {
            type: option.value === undefined ? ('boolean' as const) : ('string' as const),
            multiple: option.multiple ?? false,
          },
        ]),
      ),
    });
  } catch (error) {
    throw usageError(error instanceof Error ? error.message : String(error));
  }
  if (parsed.positionals.length !== files.length) {
    throw usageError(`Expected ${files.join(' ')}, got ${parsed.positionals.length} file name(s).`);
  }
  const values = parsed.values;
  const text = (name: string): string | undefined => {
    const value = values[name];
    return typeof value === 'string' ? value : undefined;
  };
  return {
    positionals: parsed.positionals,
    text,
    texts: (name) => {
      const value = values[name];
      return Array.isArray(value) ? value.filter((entry) => typeof entry === 'string') : [];
    },
    flag: (name) => values[name] === true,
    number: (name, fallback, min, max) => {
      const given = text(name);
      return given === undefined ? fallback : readNumber(name, given, min, max);
    },
  };
}

/** Reads `NAME=0..1` pairs. */
export function readKnobs(pairs: readonly string[]): ReadonlyMap<string, number> {
  return new Map(
    pairs.map((pair) => {
      const cut = pair.indexOf('=');
      if (cut <= 0) throw usageError(`--knob is “${pair}”; it takes NAME=POSITION, as in treble=0.5.`);
      return [
        pair.slice(0, cut),
        readNumber(`knob ${pair.slice(0, cut)}`, pair.slice(cut + 1), 0, 1),
      ] as const;
    }),
  );
}

/** Reads a list of frequencies in hertz, separated by commas. */
export function readFrequencies(option: string, text: string): readonly number[] {
  return text.split(',').map((entry) => readNumber(option, entry, 1e-6, 1e9));
}
