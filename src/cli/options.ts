// The commands and their options in one table, from which arguments are read and the help is printed.
import { type ParseArgsConfig, parseArgs } from 'node:util';
import { UsageError } from './world.ts';

export interface Command {
  readonly name: CommandName;
  readonly usage: string;
  readonly summary: string;
  readonly options: Readonly<Record<string, Option>>;
}

export interface Option {
  readonly type: 'boolean' | 'string';
  readonly short?: string;
  /** What stands behind the option in the help. */
  readonly value?: string;
  readonly choices?: readonly string[];
  readonly help: string;
}

export type CommandName = 'check' | 'print' | 'language-server';

const COLOUR: Option = {
  type: 'string',
  value: 'WHEN',
  choices: ['auto', 'always', 'never'],
  help: 'colour: auto (on a terminal, unless NO_COLOR is set), always or never',
};

export const COMMANDS: readonly Command[] = [
  {
    name: 'check',
    usage: 'check PATH…',
    summary: 'solve notes, or every note below a folder, and report answers and mistakes',
    options: {
      json: { type: 'boolean', help: 'write the results as one JSON object' },
      color: COLOUR,
    },
  },
  {
    name: 'print',
    usage: 'print NOTE [-o FILE]',
    summary: 'write a note with its results as one HTML page that needs no network',
    options: {
      output: {
        type: 'string',
        short: 'o',
        value: 'FILE',
        help: 'where to write the page; without it, standard output',
      },
    },
  },
  {
    name: 'language-server',
    usage: 'language-server --stdio',
    summary: 'serve an editor over the Language Server Protocol',
    options: {
      stdio: { type: 'boolean', help: 'speak over standard input and output' },
    },
  },
];

export interface Arguments {
  readonly positionals: readonly string[];
  readonly flags: Readonly<Record<string, boolean>>;
  readonly values: Readonly<Record<string, string>>;
}

/** Throws a `UsageError` that names the argument at fault. */
export function readArguments(command: Command, args: readonly string[]): Arguments {
  const options: ParseArgsConfig['options'] = { help: { type: 'boolean', short: 'h' } };
  for (const [name, { type, short }] of Object.entries(command.options)) {
    options[name] = short === undefined ? { type } : { type, short };
  }
  const { values: read, positionals } = parsed(args, options);
  const flags: Record<string, boolean> = {};
  const values: Record<string, string> = {};
  for (const [name, value] of Object.entries(read)) {
    if (typeof value === 'boolean') flags[name] = value;
    if (typeof value === 'string') values[name] = checkedChoice(name, value, command.options[name]?.choices);
  }
  return { positionals, flags, values };
}

export function helpText(): string {
  const commands = COMMANDS.map(({ usage, summary }) => [`tautline ${usage}`, summary] as const);
  const options = COMMANDS.flatMap(command =>
    Object.entries(command.options).map(
      ([name, option]) => [`${command.name} ${spelling(name, option)}`, option.help] as const,
    ),
  );
  return [
    'Structural calculation notes in Markdown that solve themselves.',
    '',
    ...columns(commands),
    '',
    'Options',
    ...columns(options),
    ...columns([
      ['--help, -h', 'print this'],
      ['--version', 'print the version'],
    ]),
    '',
    'Exit status',
    ...columns([
      ['0', 'all well'],
      ['1', 'a requirement is not met, a note has an error, or a note cannot be read'],
      ['2', 'wrong usage'],
    ]),
    '',
    'Nothing is read outside the folder given, or the folder of the note given.',
    "Results support a qualified engineer's judgement; they do not replace it.",
    '',
  ].join('\n');
}

function parsed(args: readonly string[], options: ParseArgsConfig['options']) {
  try {
    return parseArgs({ args: [...args], options: options ?? {}, allowPositionals: true, strict: true });
  } catch (error) {
    // Node's first sentence names the argument; what follows advises on escapes that matter to nobody here.
    throw new UsageError(error instanceof Error ? error.message.split('. ')[0]! : String(error));
  }
}

function checkedChoice(name: string, value: string, choices: readonly string[] | undefined): string {
  if (choices === undefined || choices.includes(value)) return value;
  throw new UsageError(`--${name} takes ${choices.slice(0, -1).join(', ')} or ${choices.at(-1)}, not ${value}`);
}

function spelling(name: string, { short, value }: Option): string {
  const long = value === undefined ? `--${name}` : `--${name} ${value}`;
  return short === undefined ? long : `-${short}, ${long}`;
}

function columns(rows: readonly (readonly [string, string])[]): string[] {
  return rows.map(([left, right]) => `  ${left.padEnd(30)}  ${right}`);
}
