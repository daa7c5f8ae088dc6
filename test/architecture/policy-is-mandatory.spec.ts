import { join } from 'node:path';
import ts from 'typescript';

const root = join(__dirname, '../..');
const probe = join(root, 'server/http/probe-of-a-route.ts');

const route = (parts: string): string => `
import { defineRoute } from './route';
export const route = defineRoute({ method: 'get', path: '/api/probe', summary: 'Probe', ${parts} handler: () => undefined });
`;

/** What the compiler says about one more file in server/http, which exists only in its memory. */
function complaintsAbout(source: string): string[] {
  const { config } = ts.readConfigFile(join(root, 'tsconfig.server.json'), ts.sys.readFile) as { config: object };
  const { options } = ts.parseJsonConfigFileContent({ ...config, files: [] }, ts.sys, root);
  const host = ts.createCompilerHost(options);
  const { getSourceFile, fileExists } = host;
  host.fileExists = (name) => name === probe || fileExists(name);
  host.getSourceFile = (name, language) => (name === probe ? ts.createSourceFile(name, source, language, true) : getSourceFile(name, language));
  const program = ts.createProgram([probe], { ...options, noEmit: true, incremental: false, tsBuildInfoFile: undefined }, host);
  const file = program.getSourceFile(probe);
  return program.getSemanticDiagnostics(file).map(({ messageText }) => ts.flattenDiagnosticMessageText(messageText, ' '));
}

describe('a route', () => {
  it('compiles with a policy', () => {
    expect(complaintsAbout(route(`policy: { kind: 'public' },`))).toEqual([]);
    expect(complaintsAbout(route(`policy: { kind: 'signed-in', scope: 'read', roles: ['lab'] },`))).toEqual([]);
  }, 60_000);

  it('does not compile without a policy, without a scope, or with an unknown role', () => {
    expect(complaintsAbout(route('')).join()).toMatch(/'policy' is missing/);
    expect(complaintsAbout(route(`policy: { kind: 'signed-in' },`)).join()).toMatch(/'scope' is missing/);
    expect(complaintsAbout(route(`policy: { kind: 'signed-in', scope: 'read', roles: ['owner'] },`)).join()).toMatch(/"owner"' is not assignable/);
  }, 60_000);
});
