/** The stages of `npm test`, in order, and how each is run. A stage gives { passed, failed, note? }. */
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { projectFolder } from './dependencies.mjs';
import { run } from './processes.mjs';

const program = (name) => join(projectFolder, 'node_modules/.bin', name);
const reportFolder = join(projectFolder, '.cache/test');

async function once(context, name, args) {
  const { code } = await run(program(name), args, { show: true, check: false, cwd: projectFolder, env: context.environment, onStart: context.onStart });
  return code === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

/** Two at a time, as the compiler uses one processor; lanes of about the same length. */
const typeLanes = [
  ['client', 'spec-client'],
  ['server', 'test', 'shared'],
];

async function types(context) {
  const sum = { passed: 0, failed: 0 };
  const walk = async (lane) => {
    for (const project of lane) {
      const { passed, failed } = await once(context, 'tsc', ['-p', `tsconfig.${project}.json`, '--noEmit']);
      sum.passed += passed;
      sum.failed += failed;
    }
  };
  await Promise.all(typeLanes.map(walk));
  return sum;
}

const jest = (project, workers = 2) => async (context) => {
  const report = join(reportFolder, `${project}.json`);
  mkdirSync(reportFolder, { recursive: true });
  rmSync(report, { force: true });
  const args = ['--selectProjects', project, '--json', `--outputFile=${report}`, `--maxWorkers=${workers}`, ...context.patterns];
  const env = { ...context.environment, FORCE_COLOR: process.stdout.isTTY ? '1' : '0' };
  // jest prints its JSON to stdout even with an output file, and everything for people to stderr.
  const stdio = ['ignore', 'ignore', 'inherit'];
  const { code } = await run(program('jest'), args, { stdio, check: false, cwd: projectFolder, env, onStart: context.onStart });
  if (!existsSync(report)) return { passed: 0, failed: 1, note: 'jest gave no report' };
  return countTests(JSON.parse(readFileSync(report, 'utf8')), code);
};

/**
 * A suite that could not run, a test left out and an empty stage are failures: each hides something unchecked. Published
 * checks of parts that are not built are told, not counted; the architecture test lets nothing else wait.
 */
function countTests(report, code) {
  const leftOut = report.numPendingTests;
  const failed = report.numFailedTests + report.numRuntimeErrorTestSuites + leftOut;
  const notes = [];
  if (report.numTodoTests > 0) notes.push(`${report.numTodoTests} published checks wait for parts not built`);
  if (leftOut > 0) notes.push(`${leftOut} left out`);
  if (report.numTotalTests === 0) notes.push('no tests');
  const unexplained = failed === 0 && (code !== 0 || report.numTotalTests === 0) ? 1 : 0;
  return { passed: report.numPassedTests, failed: failed + unexplained, note: notes.join(', ') };
}

export const stages = [
  { name: 'lint', run: (context) => once(context, 'eslint', ['.', '--max-warnings', '0']) },
  { name: 'types', run: types },
  { name: 'shared', run: jest('shared') },
  { name: 'server', run: jest('server'), needs: ['server', 'database'] },
  { name: 'client', run: jest('client') },
  { name: 'architecture', run: jest('architecture') },
  { name: 'reference', run: jest('reference') },
  { name: 'api', run: jest('api'), needs: ['server', 'database'] },
  { name: 'e2e', run: jest('e2e', 1), needs: ['server', 'client', 'product'] },
];
