import { AuditRow } from '../audit/audit-row-entity';
import { PasswordReset } from '../accounts/password-reset-entity';
import { Person } from '../accounts/person-entity';
import { PersonalToken } from '../accounts/personal-token-entity';
import { RefreshToken } from '../accounts/refresh-token-entity';
import { Session } from '../accounts/session-entity';
import { SignInAttempt } from '../accounts/sign-in-attempt-entity';
import { CellFamily } from '../library/cell-family-entity';
import { EditionFile } from '../library/edition-file-entity';
import { Edition } from '../library/edition-entity';
import { KeptFile } from '../library/kept-file-entity';
import { OutboxLetter } from '../notices/letter-entity';
import { Result } from '../predictions/result-entity';
import { Draft } from '../projects/draft-entity';
import { Panel } from '../projects/panel-entity';
import { Project } from '../projects/project-entity';
import { Replay } from '../replays/replay-entity';
import { Content } from '../revisions/content-entity';
import { Revision } from '../revisions/revision-entity';
import { RevisionPart } from '../revisions/revision-part-entity';
import { RunChunk } from '../runs/run-chunk-entity';
import { Run } from '../runs/run-entity';
import { RunWorkerRow } from '../runs/run-worker-entity';
import { Invitation } from '../teams/invitation-entity';
import { Membership } from '../teams/membership-entity';
import { Team } from '../teams/team-entity';

/** Every entity, one line each. Entities must equal what the migrations make; a test compares them. */
export const entities: readonly (new () => object)[] = [
  Team,
  Person,
  Membership,
  Invitation,
  Session,
  RefreshToken,
  PersonalToken,
  PasswordReset,
  SignInAttempt,
  OutboxLetter,
  AuditRow,
  Replay,
  CellFamily,
  Edition,
  KeptFile,
  EditionFile,
  Result,
  Project,
  Panel,
  Draft,
  Content,
  Revision,
  RevisionPart,
  Run,
  RunChunk,
  RunWorkerRow,
];
