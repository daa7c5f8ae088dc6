/**
 * Lints planted texts and prints what was found, one list of messages per plant.
 * ESLint's configuration is an ES module, which jest's CommonJS runtime cannot load, so this runs as a process of its own.
 *
 * Input (JSON on stdin): { "root": folder or null, "plants": [{ "path", "text" }] }
 * With a root, only the walls are checked, in that tree; without, the project's own configuration in its own tree.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { ESLint } from 'eslint';
import tseslint from 'typescript-eslint';
import { wallConfig } from '../../scripts/walls.mjs';

const project = join(import.meta.dirname, '../..');
const { root, plants } = JSON.parse(readFileSync(0, 'utf8'));

const wallsOnly = (cwd) => ({
  cwd,
  overrideConfigFile: true,
  overrideConfig: [{ files: ['**/*.ts'], languageOptions: { parser: tseslint.parser } }, wallConfig(cwd)],
});
const eslint = new ESLint(root ? wallsOnly(root) : { cwd: project });

const found = [];
for (const { path, text } of plants) {
  const [result] = await eslint.lintText(text, { filePath: join(root ?? project, path) });
  found.push(result.messages.map(({ ruleId, message }) => `${ruleId ?? 'parse'}: ${message}`));
}
process.stdout.write(JSON.stringify(found));
