import { spawnSync } from 'node:child_process';
import { projectPath } from './files';

export interface CommandResult {
  status: number | null;
  stdout: string;
  stderr: string;
}

/** Runs the predict command as a person would; paths are relative to `cwd`, the top of the project by default. */
export function runPredict(args: readonly string[], cwd = projectPath('')): CommandResult {
  // A run started by npm leaves the folder it was called from in the environment: the command would resolve against it.
  const { INIT_CWD: _, ...env } = process.env;
  const launch = projectPath('src/cli/launch.mjs');
  const result = spawnSync(process.execPath, [launch, 'predict', ...args], { cwd, env, encoding: 'utf8' });
  return { status: result.status, stdout: result.stdout, stderr: result.stderr };
}
