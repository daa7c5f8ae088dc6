import type { About } from '../shared/contracts/session';
import { AccountService } from './accounts/account-service';
import { demoAccounts } from './accounts/demo-accounts';
import { PasswordHasher } from './accounts/password-hash';
import { PasswordService } from './accounts/password-service';
import { PersonService } from './accounts/person-service';
import { SessionService } from './accounts/session-service';
import { SignInService } from './accounts/sign-in-service';
import { TokenService } from './accounts/token-service';
import { AuditService } from './audit/audit-service';
import { isHttps } from './config';
import type { Ground } from './database/ground';
import type { Callers } from './http/authentication';
import { PredictionEngine, limitsFor } from './engine/prediction-engine';
import { createPredictionRunner, type PredictionRunner } from './engine/prediction-runner';
import { EventStreams } from './http/event-streams';
import { ImportService } from './library/import-service';
import { createInspectionRunner } from './library/inspection-runner';
import { LibraryService } from './library/library-service';
import { LetterService } from './notices/letter-service';
import { FigureService } from './predictions/figure-service';
import { PredictionService } from './predictions/prediction-service';
import { ResultService } from './predictions/result-service';
import { DesignContentService } from './projects/design-content-service';
import { DraftService } from './projects/draft-service';
import { PanelService } from './projects/panel-service';
import { ProjectService } from './projects/project-service';
import { ReplayService } from './replays/replay-service';
import { ComparisonService } from './revisions/comparison-service';
import { ExportService } from './revisions/export-service';
import { RevisionService } from './revisions/revision-service';
import { RunChunkService } from './runs/run-chunk-service';
import { RunDispatchService } from './runs/run-dispatch-service';
import { RunEvents } from './runs/run-events';
import { RunPlanningService } from './runs/run-planning-service';
import { RunQueueRepository } from './runs/run-queue-repository';
import { RunRosterService } from './runs/run-roster-service';
import { RunService } from './runs/run-service';
import { InvitationService } from './teams/invitation-service';
import { MembershipService } from './teams/membership-service';
import { TeamService } from './teams/team-service';
import { version } from './version';

/** What the house needs from whoever opens it. */
export interface HouseOptions {
  readonly ground: Ground;
  readonly isSchemaReady: () => Promise<boolean>;
  /** Cheaper hashing for tests that sign in often. */
  readonly hasher?: PasswordHasher;
  /** What computes predictions; threads of the engine unless given. */
  readonly predictionRunner?: PredictionRunner;
}

/** The services of all features, made once per process, one line each. A feature reaches another one only through these. */
function createServices({ ground, hasher = new PasswordHasher(), predictionRunner }: HouseOptions) {
  const memberships = new MembershipService(ground);
  const replays = new ReplayService(ground);
  const people = new PersonService(ground, hasher);
  const audit = new AuditService(ground, (transaction, ids) => people.names(transaction, ids));
  const letters = new LetterService(ground);
  const sessions = new SessionService({ ground, memberships, letters });
  const signIn = new SignInService({ ground, people, hasher });
  const passwords = new PasswordService({ ground, people, hasher, signIn, sessions, memberships, letters, audit });
  const tokens = new TokenService({ ground, memberships, audit });
  const account = new AccountService({ ground, people, audit });
  const teams = new TeamService({ ground, people, sessions, audit });
  const invitations = new InvitationService({ ground, people, sessions, signIn, memberships, letters, audit });
  const library = new LibraryService(ground, {
    namesOfPeople: (transaction, ids) => people.names(transaction, ids),
    usesOfEdition: (teamId, editionId) => design.revisions.usesOfEdition(teamId, editionId),
    countUses: (teamId) => design.revisions.countUses(teamId),
  });
  const engine = new PredictionEngine(predictionRunner ?? createPredictionRunner(ground.config.workerCount), limitsFor(ground.config.workerCount));
  const design = createDesignServices({ ground, people, audit, library, engine });
  const running = createRunServices({ ground, audit, ...design });
  const inspections = createInspectionRunner();
  const imports = new ImportService(ground, { library, audit, runner: inspections });
  return { ...design, ...running, engine, library, inspections, imports, hasher, memberships, replays, people, audit, letters, sessions, signIn, passwords, tokens, account, teams, invitations };
}

interface DesignParts {
  readonly ground: Ground;
  readonly people: PersonService;
  readonly audit: AuditService;
  readonly library: LibraryService;
  readonly engine: PredictionEngine;
}

/** Predictions, projects and revisions. */
function createDesignServices({ ground, people, audit, library, engine }: DesignParts) {
  const predictions = new PredictionService(engine, library);
  const figures = new FigureService(ground, predictions);
  const contents = new DesignContentService(library);
  const drafts = new DraftService(ground, (transaction, ids) => people.names(transaction, ids));
  const revisions = new RevisionService({ ground, drafts, contents, figures, audit });
  const comparisons = new ComparisonService({ ground, drafts, revisions, predictions, library });
  const exports = new ExportService({ ground, drafts, revisions, predictions, library, audit, productVersion: version });
  const panels = new PanelService({ ground, drafts, contents, revisions, audit });
  const projects = new ProjectService({ ground, drafts, revisions, figures, audit });
  return { predictions, figures, contents, drafts, revisions, comparisons, exports, panels, projects };
}

interface RunParts {
  readonly ground: Ground;
  readonly audit: AuditService;
  readonly contents: DesignContentService;
  readonly drafts: DraftService;
  readonly revisions: RevisionService;
}

/** Runs: what the server answers of them, and what a worker does. */
function createRunServices({ ground, audit, contents, drafts, revisions }: RunParts) {
  const results = new ResultService(ground);
  const runQueue = new RunQueueRepository(ground.transactions, {
    maintenanceSeconds: Math.max(1, Math.floor(ground.config.runExpirySeconds / 6)),
    onError: (error) => ground.logger.error({ err: error }, 'the queue could not be looked after'),
  });
  const dispatcher = new RunDispatchService(ground, runQueue);
  const planner = new RunPlanningService({ ground, drafts, revisions, contents });
  const runs = new RunService({ ground, drafts, planner, dispatcher, results, audit });
  const runChunks = new RunChunkService({ ground, queue: runQueue, dispatcher, results });
  const runRoster = new RunRosterService(ground);
  const runEvents = new RunEvents(runs, ground.logger);
  return { runs, runQueue, runChunks, runRoster, runEvents };
}

const SWEEP_MS = 6 * 3600 * 1000;

export interface House extends ReturnType<typeof createServices> {
  readonly ground: Ground;
  readonly secure: boolean;
  readonly callers: Callers;
  readonly eventStreams: EventStreams;
  readonly describe: () => About;
  readonly isReady: () => Promise<boolean>;
  /** Begins what runs in the background: only the program that serves does. */
  start(): Promise<void>;
  /** From now on `isReady` says no, so that nobody sends new work here, and streams of events end. */
  drain(): void;
  /** Stops what the services keep running: pools, timers, servers. */
  close(): Promise<void>;
}

export function createHouse(options: HouseOptions): House {
  const { ground } = options;
  const services = createServices(options);
  const { engine, exports, figures, inspections, letters, passwords, replays, runEvents, runs, sessions, tokens } = services;
  const eventStreams = new EventStreams();
  let draining = false;
  let sweeper: NodeJS.Timeout | undefined;
  return {
    ...services,
    ground,
    eventStreams,
    secure: isHttps(ground.config),
    callers: { bySession: (sessionId, personId) => sessions.callerOf(sessionId, personId), byToken: (secret) => tokens.callerOf(secret) },
    describe: () => ({
      name: 'Slantwise',
      version,
      demoMode: ground.config.demoMode,
      letterBox: letters.usesLetterBox,
      demoAccounts: ground.config.demoMode ? demoAccounts.map(({ email, role }) => ({ email, role })) : [],
    }),
    isReady: async () => !draining && (await options.isSchemaReady()),
    start: async () => {
      await letters.start();
      sweeper = setInterval(() => {
        Promise.all([sessions.sweep(), replays.sweep(), figures.sweep(), runs.sweep()]).catch((error: unknown) => ground.logger.error({ err: error }, 'old rows could not be swept'));
      }, SWEEP_MS).unref();
    },
    drain: () => {
      draining = true;
      runEvents.close();
      eventStreams.endAll();
    },
    close: async () => {
      clearInterval(sweeper);
      runEvents.close();
      await passwords.settled();
      await letters.close();
      await inspections.close();
      await exports.close();
      await engine.close();
    },
  };
}
