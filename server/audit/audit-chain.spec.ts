import { CHAIN_START, chainStart, followChain, hashOfRow, type ChainedRow } from './audit-chain';

type Row = ChainedRow & { hash: string };

function chainOf(count: number): Row[] {
  const rows: Row[] = [];
  for (let sequence = 1; sequence <= count; sequence += 1) {
    const row = {
      teamId: 'team',
      sequence,
      at: new Date(Date.UTC(2027, 0, 1, 0, sequence)),
      personId: sequence % 2 === 0 ? 'person' : null,
      action: 'thing.changed',
      object: `thing:${sequence}`,
      detail: { after: sequence },
      previousHash: rows.at(-1)?.hash ?? CHAIN_START,
    };
    rows.push({ ...row, hash: hashOfRow(row) });
  }
  return rows;
}

describe('followChain', () => {
  it('follows a whole chain to its end, in one go or in pieces', () => {
    const rows = chainOf(6);
    const end = { sequence: 6, hash: rows[5]?.hash };
    expect(followChain(chainStart, rows)).toEqual(end);
    const middle = followChain(chainStart, rows.slice(0, 4));
    expect('brokenAt' in middle ? middle : followChain(middle, rows.slice(4))).toEqual(end);
    expect(followChain(chainStart, [])).toEqual(chainStart);
  });

  const changes: Record<string, Partial<Row>> = {
    detail: { detail: { after: 99 } },
    action: { action: 'thing.left' },
    object: { object: 'thing:9' },
    time: { at: new Date(0) },
    person: { personId: 'someone else' },
    team: { teamId: 'other' },
    hash: { hash: '1'.repeat(64) },
    'previous hash': { previousHash: '1'.repeat(64) },
  };
  it.each(Object.entries(changes))('notices a changed %s', (_what, change) => {
    const rows = chainOf(5).map((row) => (row.sequence === 3 ? { ...row, ...change } : row));
    expect(followChain(chainStart, rows)).toEqual({ brokenAt: 3 });
  });

  it('notices a row rewritten together with its own hash, by the next one', () => {
    const rows = chainOf(5);
    const forged = { ...(rows[1] as Row), detail: { after: 99 } };
    rows[1] = { ...forged, hash: hashOfRow(forged) };
    expect(followChain(chainStart, rows)).toEqual({ brokenAt: 3 });
  });

  it('notices a missing, a repeated and a swapped row', () => {
    const [a, b, c, d] = chainOf(4) as [Row, Row, Row, Row];
    expect(followChain(chainStart, [a, c, d])).toEqual({ brokenAt: 2 });
    expect(followChain(chainStart, [a, b, b])).toEqual({ brokenAt: 3 });
    expect(followChain(chainStart, [a, c, b, d])).toEqual({ brokenAt: 2 });
  });
});
