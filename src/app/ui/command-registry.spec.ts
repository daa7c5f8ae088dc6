import { TestBed } from '@angular/core/testing';
import { CommandRegistry, findCommands } from './command-registry';
import type { Command } from './command-registry';

const command = (label: string, words = ''): Command => ({ id: label, label, kind: 'sheet', words, run: () => undefined });

describe('commands', () => {
  const all = [command('Panel A, lighthouse relay', '28 GHz'), command('Library'), command('Phase', 'map cells')];

  it('are found by every word typed, in any order and case', () => {
    expect(findCommands(all, 'RELAY panel').map(({ label }) => label)).toEqual(['Panel A, lighthouse relay']);
    expect(findCommands(all, 'cells').map(({ label }) => label)).toEqual(['Phase']);
    expect(findCommands(all, 'nothing like it')).toEqual([]);
  });

  it('come first when their label begins with what is typed', () => {
    expect(findCommands([command('Open the library'), command('Library')], 'lib').map(({ label }) => label)).toEqual(['Library', 'Open the library']);
  });

  it('go when their part of the client goes, but not when it was replaced meanwhile', () => {
    const registry = TestBed.inject(CommandRegistry);
    const takeBack = registry.set('sheets', all);
    registry.set('sheets', [command('Cells')]);
    takeBack();
    expect(registry.commands().map(({ label }) => label)).toEqual(['Cells']);
  });
});
