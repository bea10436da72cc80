import { readFileSync, statSync, writeFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { parseLayout } from '../formats/layout-json';
import { checkLayout } from '../layout/check';
import { type Problem, sayProblem } from '../layout/problem';
import type { Layout } from '../layout/schema';
import type { Prediction } from '../predict/prediction';
import { predictionJson } from '../predict/prediction-json';
import { predict } from '../predict/run';
import { predictionText } from '../report/prediction-text';
import { summarise } from '../report/quantities';
import { seatsCsv } from '../report/seats-csv';

const USAGE = `Usage: npm run --silent predict -- FILE [--scheme ID] [--as text|json|csv] [--out FILE] [--check]

  FILE          a layout, *.layout.json
  --scheme ID   predict this scheme only
  --as FORM     text for reading (the default), json, or csv with a row a seat
  --out FILE    write there instead of printing; never over the layout itself
  --check       exit status 1 when a seat falls short
`;

const FORMS = ['text', 'json', 'csv'] as const;
type Form = (typeof FORMS)[number];

interface Request {
  file: string;
  scheme: string | undefined;
  form: Form;
  out: string | undefined;
  check: boolean;
}

/** An argument or a file that cannot be used; its message says what would be accepted. */
class Unusable extends Error {}

/** The predict command. Exit status 0 when predicted, 1 with `--check` and a seat short, 2 for input that cannot be used. */
export async function main(argv: string[]): Promise<number> {
  try {
    if (argv.includes('--help') || argv.includes('-h')) {
      process.stdout.write(USAGE);
      return 0;
    }
    return run(readRequest(argv));
  } catch (error) {
    if (!(error instanceof Unusable)) throw error;
    process.stderr.write(`${error.message}\n`);
    return 2;
  }
}

function run(request: Request): number {
  const { layout, problems } = readFile(request.file);
  if (request.scheme !== undefined && !layout.schemes.some((scheme) => scheme.id === request.scheme)) {
    const known = layout.schemes.map((scheme) => scheme.id).join(', ');
    throw new Unusable(`--scheme: "${request.scheme}" is not a scheme of ${request.file}; there are: ${known}.`);
  }
  const prediction = predict(layout, request.scheme === undefined ? undefined : [request.scheme]);
  write(request, render(request.form, layout, prediction, problems));
  const short = prediction.schemes.some((scheme) => summarise(scheme, null).short > 0);
  return request.check && short ? 1 : 0;
}

function readRequest(argv: string[]): Request {
  let parsed: ReturnType<typeof parse>;
  try {
    parsed = parse(argv);
  } catch (error) {
    throw new Unusable(`${(error as Error).message}\n\n${USAGE}`);
  }
  const { values, positionals } = parsed;
  if (positionals.length !== 1) throw new Unusable(`Name one layout file, found ${positionals.length}.\n\n${USAGE}`);
  const form = FORMS.find((candidate) => candidate === values.as);
  if (form === undefined) throw new Unusable(`--as: "${values.as}" is not known; one of ${FORMS.join(', ')}.`);
  const at = (path: string) => resolve(process.env.INIT_CWD ?? process.cwd(), path);
  const out = values.out === undefined ? undefined : at(values.out);
  if (out !== undefined && sameFile(out, at(positionals[0])))
    throw new Unusable('--out: this is the layout itself, which is never written over; name another file.');
  return { file: at(positionals[0]), scheme: values.scheme, form, out, check: values.check };
}

/** True for one file under two names: another spelling, a symbolic or a hard link. */
function sameFile(a: string, b: string): boolean {
  if (a === b) return true;
  try {
    const [first, second] = [a, b].map((path) => statSync(path, { bigint: true }));
    return first.dev === second.dev && first.ino === second.ino;
  } catch {
    return false;
  }
}

function parse(argv: string[]) {
  return parseArgs({
    args: argv,
    allowPositionals: true,
    options: {
      scheme: { type: 'string' },
      as: { type: 'string', default: 'text' },
      out: { type: 'string' },
      check: { type: 'boolean', default: false },
    },
  });
}

function readFile(path: string): { layout: Layout; problems: Problem[] } {
  let text: string;
  try {
    text = readFileSync(path, 'utf8');
  } catch (error) {
    throw new Unusable(`${path}: cannot be read (${(error as NodeJS.ErrnoException).code}); name a file that exists.`);
  }
  const outcome = parseLayout(text);
  const problems = [...outcome.problems, ...(outcome.ok ? checkLayout(outcome.value) : [])];
  const errors = problems.filter((problem) => problem.severity === 'error');
  if (!outcome.ok || errors.length > 0) throw new Unusable([`${path}:`, ...errors.map(sayProblem)].join('\n  '));
  return { layout: outcome.value, problems };
}

function render(form: Form, layout: Layout, prediction: Prediction, problems: readonly Problem[]): string {
  if (form === 'json') return `${JSON.stringify(predictionJson(layout, prediction), null, 1)}\n`;
  if (form === 'csv') return seatsCsv(layout, prediction);
  return predictionText(layout, prediction, problems);
}

function write(request: Request, text: string): void {
  if (request.out === undefined) {
    // A reader that has seen enough (head) closes the pipe: no fault of ours.
    process.stdout.once('error', (error: NodeJS.ErrnoException) => {
      if (error.code !== 'EPIPE') throw error;
    });
    process.stdout.write(text);
    return;
  }
  try {
    writeFileSync(request.out, text);
  } catch (error) {
    throw new Unusable(`--out: ${request.out} cannot be written (${(error as NodeJS.ErrnoException).code}).`);
  }
}
