import type { Command } from '../store/command.ts';
import { clipCommands } from './clipCommands.ts';
import { glassCommands } from './glassCommands.ts';
import { partCommands } from './partCommands.ts';
import type { CommandGroup, Services } from './services.ts';
import { positionCommands, stopAndImageCommands } from './settingCommands.ts';
import { sketchCommands } from './sketchCommands.ts';
import { selectionCommands, viewCommands } from './viewCommands.ts';

/** Every command there is, in the groups that help lists them in. Buttons, keys, menus and help all read these values. */
export function createCommands(services: Services): readonly CommandGroup[] {
  return [
    sketchCommands(services),
    partCommands(),
    glassCommands(),
    selectionCommands(),
    clipCommands(services),
    stopAndImageCommands(),
    positionCommands(),
    viewCommands(services),
  ];
}

/** The commands of all groups by their ids. */
export function commandsById(groups: readonly CommandGroup[]): ReadonlyMap<string, Command> {
  return new Map(groups.flatMap((group) => group.commands.map((command) => [command.id, command])));
}
