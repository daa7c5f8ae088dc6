import { demoActor } from '../accounts/demo-account-service';
import type { PersonService } from '../accounts/person-service';
import type { Ground } from '../database/ground';
import type { LibraryService } from '../library/library-service';
import type { RevisionService } from '../revisions/revision-service';
import type { MembershipService } from '../teams/membership-service';
import type { DesignDocument } from '../../shared/model/design-document';
import { DEMO_PANELS, DEMO_PROJECT, onEdition, type DemoPanel, type DemoRevision } from './demo-designs';
import type { Actor } from './draft-service';
import type { PanelService } from './panel-service';
import type { ProjectService } from './project-service';

interface Parts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly people: PersonService;
  readonly memberships: MembershipService;
  readonly library: LibraryService;
  readonly projects: ProjectService;
  readonly panels: PanelService;
  readonly revisions: RevisionService;
}

/** Draws the demonstration project in the name of its designer; takes up where an earlier start broke off. */
export async function seedProjects(parts: Parts): Promise<void> {
  const actor = await demoActor(parts, 'designer');
  const known = await parts.projects.list(actor.teamId);
  // Whatever its people renamed it to, it is there.
  const project = known.find(({ invented }) => invented) ?? (await parts.projects.create(actor, DEMO_PROJECT, { invented: true }));
  for (const [i, demo] of DEMO_PANELS.entries()) await drawPanel(parts, actor, { projectId: project.id, panelId: project.panels[i]?.id }, demo);
}

/** Freezes the revisions that the panel does not have yet; one that people went on with has them all. */
async function drawPanel(parts: Parts, actor: Actor, at: { projectId: string; panelId: string | undefined }, demo: DemoPanel): Promise<void> {
  const [first] = demo.revisions;
  const design = await designOf(parts, actor.teamId, first);
  const panelId = at.panelId ?? (await parts.panels.create(actor, at.projectId, { name: demo.name, design })).id;
  const frozen = (await parts.revisions.list(actor.teamId, panelId)).length;
  for (const revision of demo.revisions.slice(frozen)) {
    const { etag } = await parts.panels.detail(actor.teamId, panelId);
    const saved = await parts.panels.saveDraft(actor, panelId, { design: await designOf(parts, actor.teamId, revision), ifMatch: etag });
    await parts.revisions.freeze(actor, panelId, { message: revision.message, ifMatch: saved.etag });
  }
}

async function designOf({ library }: Parts, teamId: string, { design, familyName }: DemoRevision): Promise<DesignDocument> {
  if (familyName === undefined) return design;
  const edition = await library.newestEdition(teamId, familyName);
  if (edition === null) throw new Error(`the library has no published edition of ${JSON.stringify(familyName)}`);
  return onEdition(design, edition.id);
}
