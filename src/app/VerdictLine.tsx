import { sayProblem } from '../layout/problem';
import { refOfPath } from '../layout/problem-ref';
import { type Said, verdict } from '../report/verdict';
import { SHORT_FILTER } from '../seats/filter';
import { currentScheme, useSession, useStale } from '../session/session';

/** The sentence across the top, always true for what is shown. Each noun selects the thing it names. */
export default function VerdictLine() {
  const layout = useSession((session) => session.history.layout);
  const scheme = useSession(currentScheme);
  const prediction = useSession((session) => session.prediction);
  const problems = useSession((session) => session.problems);
  const failure = useSession((session) => session.failure);
  const talkerId = useSession((session) => session.talkerId);
  const stale = useStale();
  const error = problems.find((problem) => problem.severity === 'error');

  if (failure !== null) {
    return (
      <Line
        sentence={[
          { text: `The calculation failed: ${failure}. The layout is safe; undo the last change or save it.` },
        ]}
      />
    );
  }
  if (error !== undefined) {
    const { text, ref } = refOfPath(layout, error.path);
    const words = sayProblem({ ...error, path: '' });
    // "c1 is outside the room" names what it is about; anything else is led by its place.
    const named = ref !== null && words.startsWith(`${ref.id} `);
    const place: Said = { text: named ? ref.id : text, ...(ref !== null && { ref }) };
    const rest = named ? words.slice(ref.id.length) : `${text === '' ? '' : ': '}${words}`;
    const said: Said[] = [{ text: 'Not predicted: ' }, place, { text: rest }];
    return <Line sentence={said} trouble />;
  }
  if (prediction === null) return <Line sentence={[{ text: 'Predicting every seat…' }]} />;
  const { sentence, peaks } = verdict(layout, scheme, prediction, talkerId);
  return <Line sentence={sentence} peaks={peaks} stale={stale} />;
}

interface LineProps {
  sentence: readonly Said[];
  peaks?: { text: string; covered: boolean } | null;
  stale?: boolean;
  trouble?: boolean;
}

function Line({ sentence, peaks = null, stale = false, trouble = false }: LineProps) {
  return (
    <p className="verdict" role="status" data-stale={stale} data-trouble={trouble}>
      <span className="verdict-sentence">
        {sentence.map((said, i) => (
          // The sentence is made anew each time; its pieces have no identity but their place.
          // biome-ignore lint/suspicious/noArrayIndexKey: see above
          <Piece key={i} said={said} />
        ))}
      </span>
      {peaks !== null && (
        <span className="verdict-peak" data-covered={peaks.covered}>
          {peaks.text}
        </span>
      )}
    </p>
  );
}

function Piece({ said }: { said: Said }) {
  const { ref, filter } = said;
  if (ref === undefined && filter === undefined) return said.text;
  const follow = () => {
    const session = useSession.getState();
    if (filter === 'short') session.setSeatFilter(session.seatFilter === SHORT_FILTER ? '' : SHORT_FILTER);
    if (ref !== undefined) session.select(ref);
  };
  return (
    <button type="button" className="verdict-link" onClick={follow}>
      {said.text}
    </button>
  );
}
