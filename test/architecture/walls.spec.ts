import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, relative } from 'node:path';
import { lintPlants } from './planted-lint';
import { wallPlants } from './wall-plants';
import type { WallPlant } from './wall-plants';

const project = join(__dirname, '../..');
const isFile = (target: string): boolean => target.endsWith('.ts');

function statement({ from, to, how = 'import' }: WallPlant): string {
  const path = relative(dirname(from), to).replace(/\.ts$/, '');
  const source = isFile(to) ? (path.startsWith('.') ? path : `./${path}`) : to;
  const forms: Record<NonNullable<WallPlant['how']>, string> = {
    import: `import * as target from '${source}';`,
    type: `import type { Target } from '${source}';`,
    export: `export { target } from '${source}';`,
    dynamic: `void import('${source}');`,
    'inline-type': `export type Target = import('${source}').Target;`,
  };
  return forms[how];
}

/** Paths in the temporary tree hold every file that a plant opens, so that each import resolves as it would in the project. */
function plantTree(): string {
  const root = mkdtempSync(join(tmpdir(), 'slantwise-walls-'));
  for (const { to } of wallPlants.filter((plant) => isFile(plant.to))) {
    mkdirSync(dirname(join(root, to)), { recursive: true });
    writeFileSync(join(root, to), 'export const target = 1;\nexport type Target = number;\n');
  }
  symlinkSync(join(project, 'node_modules'), join(root, 'node_modules'));
  return root;
}

describe('the walls between rooms', () => {
  let root = '';
  let found: string[][] = [];

  beforeAll(() => {
    root = plantTree();
    found = lintPlants(
      root,
      wallPlants.map((plant) => ({ path: plant.from, text: statement(plant) })),
    );
  }, 60_000);

  afterAll(() => rmSync(root, { recursive: true, force: true }));

  it.each(wallPlants.map((plant, index) => [plant.passes ? 'lets' : 'stops', plant.from, statement(plant), index] as const))(
    '%s %s: %s',
    (verdict, from, text, index) => {
      const walls = (found[index] ?? ['not linted']).filter((message) => message.startsWith('boundaries/dependencies'));
      expect(found[index]).toEqual(walls);
      expect({ from, text, stopped: walls.length === 1 }).toEqual({ from, text, stopped: verdict === 'stops' });
    },
  );

  it('refuses a file that belongs to no room', () => {
    const [messages] = lintPlants(root, [{ path: 'shared/elsewhere/planted.ts', text: 'export const planted = 1;' }]);
    expect(messages).toEqual([expect.stringContaining('boundaries/no-unknown-files')]);
  });
});

describe("the project's own lint configuration", () => {
  const plants: readonly (readonly [rule: string, path: string, text: string])[] = [
    ['boundaries/dependencies', 'shared/units/planted.ts', "export { besselJ0 } from '../math/bessel';\n"],
    ['boundaries/dependencies', 'server/projects/planted-service.ts', "import * as typeorm from 'typeorm';\nexport const planted = typeorm;\n"],
    ['no-restricted-syntax', 'shared/model/planted.ts', "import { z } from 'zod';\nexport const planted = z;\n"],
    ['no-restricted-syntax', 'shared/model/planted.ts', "export * as z from 'zod';\n"],
    ['no-restricted-syntax', 'shared/model/planted.ts', "import * as z from 'zod';\nexport { z };\n"],
    ['no-restricted-syntax', 'shared/units/planted.ts', 'export enum Planted { One }\n'],
    ['no-restricted-syntax', 'shared/units/planted.ts', 'export default function planted(): void { return; }\n'],
    ['@typescript-eslint/no-explicit-any', 'shared/units/planted.ts', 'export const planted = (value: any): number => value;\n'],
    ['@typescript-eslint/ban-ts-comment', 'shared/units/planted.ts', '// @ts-ignore: planted\nexport const planted = 1;\n'],
    ['no-console', 'server/projects/planted-service.ts', "console.log('planted');\nexport const planted = 1;\n"],
    ['max-lines', 'shared/units/planted.ts', `${'// planted\n'.repeat(400)}export const planted = 1;\n`],
    ['max-params', 'shared/units/planted.ts', 'export const planted = (a: number, b: number, c: number, d: number, e: number) => a + b + c + d + e;\n'],
  ];
  let found: string[][] = [];

  beforeAll(() => {
    found = lintPlants(
      null,
      plants.map(([, path, text]) => ({ path, text })),
    );
  }, 60_000);

  it.each(plants.map(([rule, path, text], index) => [rule, path, text.split('\n')[0], index] as const))('reports %s in %s: %s', (rule, _path, _text, index) => {
    expect(found[index]).toEqual([expect.stringContaining(`${rule}: `)]);
  });

  it('has nothing to say about a plain file', () => {
    expect(lintPlants(null, [{ path: 'shared/units/planted.ts', text: 'export const planted = 1;\n' }])).toEqual([[]]);
  });
});
