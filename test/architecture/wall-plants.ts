/** One import planted in a file: which file, what it opens, and whether the walls let it pass. */
export interface WallPlant {
  readonly from: string;
  /** A file of the tree, or the name of a package or core module. */
  readonly to: string;
  readonly passes: boolean;
  readonly how?: 'import' | 'type' | 'export' | 'dynamic' | 'inline-type';
}

type Row = readonly [from: string, to: string, how?: WallPlant['how']];

const rows = (passes: boolean, list: readonly Row[]): WallPlant[] => list.map(([from, to, how]) => ({ from, to, passes, how }));

const file = (room: string): string => `shared/${room}/planted.ts`;
const sharedRooms = ['units', 'math', 'waves', 'antenna', 'files', 'model', 'contracts'] as const;

/** The arrows between the shared rooms as the architecture states them, written out a second time on purpose. */
const sharedArrows: Record<(typeof sharedRooms)[number], readonly string[]> = {
  units: [],
  math: ['units'],
  waves: ['units', 'math'],
  antenna: ['units', 'math', 'waves', 'model'],
  files: ['units', 'math', 'model'],
  model: ['units'],
  contracts: ['units', 'model'],
};

const sharedPlants = sharedRooms.flatMap((from) =>
  sharedRooms.map((to) => ({ from: file(from), to: `shared/${to}/target.ts`, passes: from === to || sharedArrows[from].includes(to) })),
);

const sharedOutside = [
  ...sharedRooms.flatMap((room) =>
    rows(false, [
      [file(room), 'node:fs'],
      [file(room), 'express'],
      [file(room), 'rxjs'],
      [file(room), 'server/config.ts'],
      [file(room), 'src/app/api/target.ts'],
      [file(room), 'test/support/target.ts'],
      [file(room), 'cell-library/target.ts'],
    ]),
  ),
  ...rows(true, [
    ['shared/model/planted.ts', 'zod'],
    ['shared/contracts/planted.ts', 'zod'],
    ['shared/math/planted.spec.ts', 'fast-check'],
    ['shared/math/planted.spec.ts', 'node:fs'],
  ]),
  ...rows(false, [
    ['shared/antenna/planted.ts', 'zod'],
    ['shared/files/planted.ts', 'zod', 'type'],
    ['shared/model/planted.ts', 'mathjs'],
    ['shared/math/planted.spec.ts', 'shared/waves/target.ts'],
    ['shared/math/planted.ts', 'shared/waves/target.ts', 'type'],
    ['shared/math/planted.ts', 'shared/waves/target.ts', 'export'],
    ['shared/math/planted.ts', 'shared/waves/target.ts', 'dynamic'],
    ['shared/math/planted.ts', 'shared/waves/target.ts', 'inline-type'],
  ]),
];

const clientPlants = [
  ...rows(true, [
    ['src/main.ts', 'src/app/app.ts'],
    ['src/app/app.routes.ts', 'src/app/projects/target.ts', 'dynamic'],
    ['src/app/projects/planted.ts', 'src/app/projects/target.ts'],
    ['src/app/projects/planted.ts', 'src/app/api/target.ts'],
    ['src/app/projects/planted.ts', 'src/app/ui/target.ts'],
    ['src/app/projects/planted.ts', 'src/app/session/target.ts'],
    ['src/app/projects/planted.ts', 'shared/antenna/target.ts'],
    ['src/app/projects/planted.ts', '@angular/core'],
    ['src/app/projects/planted.ts', '@angular/material/button'],
    ['src/app/projects/planted.ts', 'rxjs'],
    ['src/app/api/planted.ts', 'shared/contracts/target.ts'],
    ['src/app/api/planted.ts', 'shared/model/target.ts'],
    ['src/app/api/planted.ts', 'zod', 'type'],
    ['src/app/ui/planted.ts', 'shared/units/target.ts'],
    ['src/app/ui/planted.ts', 'shared/math/target.ts'],
    ['src/app/ui/planted.ts', 'plotly.js-dist-min', 'dynamic'],
    ['src/app/ui/planted.ts', 'plotly.js-dist-min', 'type'],
    ['src/app/projects/planted.ts', 'mathjs', 'dynamic'],
  ]),
  ...rows(false, [
    ['src/app/projects/planted.ts', 'src/app/library/target.ts'],
    ['src/app/projects/planted.ts', 'src/app/library/target.ts', 'type'],
    ['src/app/projects/planted.spec.ts', 'src/app/library/target.ts'],
    ['src/app/projects/planted.ts', 'src/app/app.ts'],
    ['src/app/projects/planted.ts', 'server/config.ts', 'type'],
    ['src/app/projects/planted.ts', 'node:path'],
    ['src/app/projects/planted.ts', 'express', 'type'],
    ['src/app/projects/planted.ts', 'plotly.js-dist-min', 'dynamic'],
    ['src/app/ui/planted.ts', 'plotly.js-dist-min'],
    ['src/app/projects/planted.ts', 'mathjs'],
    ['src/app/projects/planted.ts', 'test/support/target.ts'],
    ['src/app/ui/planted.ts', 'shared/waves/target.ts'],
    ['src/app/ui/planted.ts', 'shared/model/target.ts'],
    ['src/app/ui/planted.ts', 'shared/contracts/target.ts'],
    ['src/app/ui/planted.ts', 'src/app/api/target.ts'],
    ['src/app/ui/planted.ts', 'src/app/session/target.ts'],
    ['src/app/ui/planted.ts', 'src/app/projects/target.ts'],
    ['src/app/api/planted.ts', 'shared/antenna/target.ts'],
    ['src/app/api/planted.ts', 'shared/units/target.ts'],
    ['src/app/api/planted.ts', 'src/app/ui/target.ts'],
    ['src/app/api/planted.ts', 'src/app/projects/target.ts'],
    ['src/app/api/planted.ts', 'zod'],
    ['src/app/session/planted.ts', 'src/app/projects/target.ts'],
  ]),
];

const serverPlants = [
  ...rows(true, [
    ['server/main.ts', 'server/app.ts'],
    ['server/main.ts', 'express'],
    ['server/app.ts', 'express'],
    ['server/app.ts', 'server/projects/project-routes.ts'],
    ['server/http/planted.ts', 'express'],
    ['server/http/planted.ts', 'shared/contracts/target.ts'],
    ['server/database/planted.ts', 'typeorm'],
    ['server/database/planted.ts', 'server/projects/project-entity.ts'],
    ['server/engine/planted.ts', 'shared/antenna/target.ts'],
    ['server/engine/planted.ts', 'piscina'],
    ['server/engine/planted.ts', 'node:worker_threads'],
    ['server/projects/planted-routes.ts', 'express'],
    ['server/projects/planted-routes.ts', 'server/projects/project-service.ts'],
    ['server/projects/planted-routes.ts', 'server/teams/team-service.ts'],
    ['server/projects/planted-routes.ts', 'server/http/target.ts'],
    ['server/projects/planted-service.ts', 'server/projects/project-repository.ts'],
    ['server/projects/planted-service.ts', 'server/teams/team-service.ts'],
    ['server/projects/planted-service.ts', 'server/projects/project-entity.ts', 'type'],
    ['server/projects/planted-repository.ts', 'server/projects/project-entity.ts'],
    ['server/projects/planted-repository.ts', 'server/database/target.ts'],
    ['server/projects/planted-repository.ts', 'typeorm'],
    ['server/projects/planted-entity.ts', 'typeorm'],
    ['server/projects/planted.ts', 'shared/antenna/target.ts'],
    ['server/projects/project-service.spec.ts', 'server/projects/project-repository.ts'],
  ]),
  ...rows(false, [
    ['server/worker.ts', 'express'],
    ['server/main.ts', 'typeorm'],
    ['server/main.ts', 'src/main.ts'],
    ['server/main.ts', '@angular/core'],
    ['server/http/planted.ts', 'typeorm'],
    ['server/http/planted.ts', 'server/projects/project-repository.ts'],
    ['server/http/planted.ts', 'server/app.ts'],
    ['server/database/planted.ts', 'express'],
    ['server/database/planted.ts', 'server/projects/project-service.ts'],
    ['server/engine/planted.ts', 'express', 'type'],
    ['server/engine/planted.ts', 'typeorm'],
    ['server/engine/planted.ts', 'server/database/target.ts'],
    ['server/engine/planted.ts', 'server/http/target.ts'],
    ['server/engine/planted.ts', 'server/projects/project-service.ts'],
    ['server/projects/planted-routes.ts', 'server/projects/project-repository.ts'],
    ['server/projects/planted-routes.ts', 'server/projects/project-entity.ts', 'type'],
    ['server/projects/planted-routes.ts', 'server/teams/team-repository.ts'],
    ['server/projects/planted-routes.ts', 'server/database/target.ts'],
    ['server/projects/planted-routes.ts', 'typeorm'],
    ['server/projects/planted-service.ts', 'server/projects/project-entity.ts'],
    ['server/projects/planted-service.ts', 'server/projects/project-routes.ts'],
    ['server/projects/planted-service.ts', 'server/teams/team-repository.ts'],
    ['server/projects/planted-service.ts', 'server/teams/team-entity.ts', 'type'],
    ['server/projects/planted-service.ts', 'express', 'type'],
    ['server/projects/planted-service.ts', 'express', 'inline-type'],
    ['server/projects/planted-service.ts', 'typeorm', 'type'],
    ['server/projects/planted-service.ts', 'server/app.ts'],
    ['server/projects/planted-repository.ts', 'server/projects/project-service.ts'],
    ['server/projects/planted-repository.ts', 'server/teams/team-entity.ts'],
    ['server/projects/planted-repository.ts', 'express'],
    ['server/projects/planted-entity.ts', 'server/projects/project-repository.ts'],
    ['server/projects/planted.ts', 'typeorm'],
    ['server/projects/planted.ts', 'express'],
    ['server/projects/planted.ts', 'server/projects/project-repository.ts'],
    ['server/projects/planted-service.ts', 'src/app/api/target.ts'],
    ['server/projects/planted-service.ts', 'test/support/target.ts'],
    ['server/projects/planted-service.ts', 'cell-library/target.ts'],
  ]),
];

export const wallPlants: readonly WallPlant[] = [...sharedPlants, ...sharedOutside, ...clientPlants, ...serverPlants];
