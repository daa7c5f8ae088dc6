import type { FamilySummary } from '../../../shared/contracts/library';
import type { Project } from '../../../shared/contracts/projects';
import type { Member } from '../../../shared/contracts/team';
import { STARTING_DESIGN } from '../../../shared/model/starting-design';
import { findCommands } from '../ui/command-registry';
import { teamFinds } from './team-finds';

const id = (n: number): string => `6f1c1b7e-58a4-4f0b-9a53-${String(n).padStart(12, '0')}`;
const author = { id: id(3), name: 'Designer' };
const projects: readonly Project[] = [
  {
    id: id(1),
    name: 'Merrow Point sea-rescue link',
    version: 1,
    invented: true,
    createdAt: '2026-11-01T10:00:00.000Z',
    panels: [
      {
        id: id(2),
        projectId: id(1),
        name: 'A, lighthouse relay',
        design: STARTING_DESIGN,
        draftHash: 'ab12cd34ef56'.padEnd(64, '0'),
        summary: null,
        latestRevision: {
          id: id(4), panelId: id(2), number: 3, hash: 'debfe0abb702'.padEnd(64, '0'), parentId: null, parentNumber: null, restoredFromNumber: null,
          author, message: 'steered', createdAt: '2026-12-01T12:00:00.000Z',
        },
        draftIsRevision: false,
        changedAt: '2026-12-01T12:00:00.000Z',
        changedBy: author,
      },
    ],
  },
];
const families: readonly FamilySummary[] = [
  { id: id(5), name: 'Ring and patch, 5 mm lattice', kind: 'ring', operation: 'reflect', periodXMm: 5, periodYMm: 5, designFrequencyGHz: 28, provenance: 'simulated', editions: [], useCount: 0 },
];
const people: readonly Member[] = [
  { id: id(6), name: 'Nora New', email: 'nora@merrow.example', roles: ['reviewer'], disabled: false, lastSeenAt: null, joinedAt: '2026-12-01T12:00:00.000Z' },
];

describe('what the palette finds of a team', () => {
  const commands = teamFinds({ projects, families, people }).map((find) => ({ ...find, run: () => undefined }));
  const found = (typed: string): string[] => findCommands(commands, typed).map(({ label }) => label);

  it('is a panel by its name, its project, its frequency, or the start of a hash', () => {
    for (const typed of ['lighthouse', 'sea-rescue', '28 ghz panel', 'ab12cd34', 'debfe0ab']) expect(found(typed)).toEqual(['A, lighthouse relay']);
  });

  it('is a family by its name and a person by name, address or role', () => {
    expect(found('ring 5 mm')).toEqual(['Ring and patch, 5 mm lattice']);
    for (const typed of ['nora', 'nora@merrow', 'reviewer']) expect(found(typed)).toEqual(['Nora New']);
  });

  it('leads to where it is', () => {
    expect(commands.map(({ path }) => path.join('/'))).toEqual([`/panels/${id(2)}/requirement`, `/library/families/${id(5)}`, '/team']);
  });
});
