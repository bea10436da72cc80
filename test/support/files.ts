import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/** Absolute path of a file given from the top of the project. */
export const projectPath = (path: string): string => fileURLToPath(new URL(`../../${path}`, import.meta.url));

/** Text of a file given from the top of the project. */
export const projectText = (path: string): string => readFileSync(projectPath(path), 'utf8');
