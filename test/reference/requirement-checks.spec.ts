import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { PublishedCheck } from './published-check';
import { linkBookChecks } from './tables/link-checks';

const { checks } = JSON.parse(readFileSync(join(__dirname, 'data', 'requirement-side.json'), 'utf8')) as { checks: readonly PublishedCheck[] };

describe('the requirement side against books, recommendations and rules', () => {
  it('runs every number that is listed', () => {
    expect(checks.map(({ id }) => id).sort()).toEqual(Object.keys(linkBookChecks).sort());
  });

  for (const check of checks) it(`${check.id}: ${check.what} [${check.source}]`, () => linkBookChecks[check.id](check));
});
