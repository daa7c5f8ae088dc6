import type { FamilySummary } from '../../../shared/contracts/library';
import type { Project } from '../../../shared/contracts/projects';
import type { Member } from '../../../shared/contracts/team';

/** Something of the team that the palette finds: where it is and the words to find it by. */
export interface TeamFind {
  readonly id: string;
  readonly label: string;
  readonly kind: 'panel' | 'family' | 'person';
  readonly words: string;
  readonly path: readonly string[];
}

const HASH_LENGTH = 12;

export interface TeamContents {
  readonly projects: readonly Project[];
  readonly families: readonly FamilySummary[];
  readonly people: readonly Member[];
}

/** Panels by name, project, frequency and the hashes of draft and revision; families by their cells; people by name, address and role. */
export function teamFinds({ projects, families, people }: TeamContents): readonly TeamFind[] {
  const panels = projects.flatMap((project) =>
    project.panels.map((panel): TeamFind => {
      const hashes = [panel.draftHash, panel.latestRevision?.hash ?? ''].map((hash) => hash.slice(0, HASH_LENGTH));
      const words = [project.name, `${panel.design.requirement.designFrequencyGHz} GHz`, ...hashes].join(' ');
      return { id: panel.id, label: panel.name, kind: 'panel', words, path: ['/panels', panel.id, 'requirement'] };
    }),
  );
  const cells = families.map((family): TeamFind => ({ id: family.id, label: family.name, kind: 'family', words: 'cells library', path: ['/library/families', family.id] }));
  const members = people.map((member): TeamFind => ({ id: member.id, label: member.name, kind: 'person', words: `${member.email} ${member.roles.join(' ')}`, path: ['/team'] }));
  return [...panels, ...cells, ...members];
}
