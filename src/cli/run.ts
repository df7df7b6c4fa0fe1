// The command line: picks the command, and turns wrong usage into a line and an exit status.
import packageFile from '../../package.json' with { type: 'json' };
import { check } from './check.ts';
import { languageServer } from './language-server.ts';
import { type Arguments, COMMANDS, type CommandName, helpText, readArguments } from './options.ts';
import { print } from './print.ts';
import { safeText } from './safe-text.ts';
import { EXIT, UsageError, type World } from './world.ts';

/** Resolves with the exit status. */
export async function run(args: readonly string[], world: World): Promise<number> {
  try {
    return await dispatch(args, world);
  } catch (error) {
    if (!(error instanceof UsageError)) throw error;
    world.error.write(`tautline: ${safeText(error.message)}\nSee tautline --help\n`);
    return EXIT.usage;
  }
}

const RUN: Readonly<Record<CommandName, (args: Arguments, world: World) => Promise<number>>> = {
  check: async (args, world) => check(args, world),
  print: async (args, world) => print(args, world),
  'language-server': languageServer,
};

async function dispatch([first, ...rest]: readonly string[], world: World): Promise<number> {
  if (first === undefined) {
    world.error.write(helpText());
    return EXIT.usage;
  }
  if (first === '--version' || first === '-v') {
    world.out.write(`${packageFile.version}\n`);
    return EXIT.well;
  }
  if (first === '--help' || first === '-h' || first === 'help') {
    world.out.write(helpText());
    return EXIT.well;
  }
  const command = COMMANDS.find(({ name }) => name === first);
  if (command === undefined) throw new UsageError(`there is no command ${first}`);
  const read = readArguments(command, rest);
  if (read.flags.help) {
    world.out.write(helpText());
    return EXIT.well;
  }
  return RUN[command.name](read, world);
}
