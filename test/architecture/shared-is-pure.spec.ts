import { join } from 'node:path';
import * as ts from 'typescript';
import { projectFolder } from './source-tree';

/** Names declared by the browser or by Node and not by the language. */
const foreign = ['window', 'document', 'process', 'Buffer', 'require', 'console', 'setTimeout', 'fetch', 'localStorage', '__dirname'];

const sentence = (name: string): string => `export const planted: unknown = ${name};\n`;
const ownSentence = 'export const planted: Float64Array = new Float64Array([Math.PI]).map(Math.cos);\n';

/** Messages of the compiler, under the settings of tsconfig.shared.json, for one planted file per text. */
function compile(texts: readonly string[]): string[][] {
  const configFile = join(projectFolder, 'tsconfig.shared.json');
  const { options } = ts.parseJsonConfigFileContent(ts.readConfigFile(configFile, ts.sys.readFile).config, ts.sys, projectFolder);
  const planted = new Map(texts.map((text, index) => [join(projectFolder, `shared/units/planted-${index}.ts`), text]));
  const settings: ts.CompilerOptions = { ...options, composite: false, incremental: false, emitDeclarationOnly: false, noEmit: true };
  const host = ts.createCompilerHost(settings);
  const readFromDisk = host.getSourceFile.bind(host);
  host.getSourceFile = (name, ...more) => {
    const text = planted.get(name);
    return text === undefined ? readFromDisk(name, ...more) : ts.createSourceFile(name, text, ts.ScriptTarget.ES2023);
  };
  const program = ts.createProgram([...planted.keys()], settings, host);
  return [...planted.keys()].map((name) =>
    ts.getPreEmitDiagnostics(program, program.getSourceFile(name)).map(({ messageText }) => ts.flattenDiagnosticMessageText(messageText, '\n')),
  );
}

describe('the compiler settings of shared', () => {
  const found = compile([...foreign.map(sentence), ownSentence]);

  it.each(foreign.map((name, index) => [name, index] as const))('do not know %s', (name, index) => {
    expect(found[index]).toEqual([expect.stringContaining(`Cannot find name '${name}'`)]);
  });

  it('know the language itself', () => {
    expect(found[foreign.length]).toEqual([]);
  });
});
