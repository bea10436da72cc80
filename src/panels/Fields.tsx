import { createContext, type ReactNode, useContext } from 'react';
import { NOMINAL_HZ } from '../acoustics/bands';
import { type Phase, QuantityField, type QuantityFieldProps } from '../controls/QuantityField';
import { sayProblem } from '../layout/problem';
import { BAND_NAMES, figure, octaveFigure } from '../report/figures';
import { lengthFigure, lengthUnit, parseLength } from '../report/units';
import { useSession } from '../session/session';
import { type ItemProblem, problemsOn } from './problems-of';

/** Problems of the thing shown, for the rows that hold the fields they are about. */
const Problems = createContext<readonly ItemProblem[]>([]);
export const ItemProblems = Problems.Provider;

/** A row of fields: what they are, then up to `columns` of them. Problems at its places in the file stand below it. */
export function Row(props: { what: string; at?: readonly string[]; columns?: 1 | 2 | 3; children: ReactNode }) {
  const { what, at = [], columns = 3, children } = props;
  const problems = problemsOn(useContext(Problems), at);
  return (
    <>
      <div className="item-row" data-columns={columns}>
        <span className="what">{what}</span>
        {children}
      </div>
      <ProblemNotes problems={problems} />
    </>
  );
}

/** Problems no row shows, at the head of a panel. */
export function OtherProblems({ shown }: { shown: readonly string[] }) {
  const problems = useContext(Problems);
  const elsewhere = problemsOn(problems, shown);
  return <ProblemNotes problems={problems.filter((problem) => !elsewhere.includes(problem))} />;
}

function ProblemNotes({ problems }: { problems: readonly ItemProblem[] }) {
  return problems.map(({ at, problem }) => (
    <p className="item-problem" data-severity={problem.severity} key={`${at} ${problem.found}`}>
      <b>{problem.severity === 'error' ? 'To mend' : 'Caution'}</b> {sayProblem({ ...problem, path: '' })}
    </p>
  ));
}

type LengthProps = Omit<QuantityFieldProps, 'unit' | 'digits' | 'parse' | 'format'> & { digits?: number };

/** A length in the units shown; values are metres. */
export function LengthField({ digits = 2, step, ...props }: LengthProps) {
  const units = useSession((session) => session.units);
  return (
    <QuantityField
      {...props}
      // An inch where feet and inches are read.
      step={units === 'metric' ? (step ?? 0.1) : 0.0254}
      unit={lengthUnit(units)}
      parse={(text) => parseLength(text, units)}
      format={(lengthM) => lengthFigure(lengthM, units, digits)}
    />
  );
}

/** The octaves of the columns below. */
function OctaveHeads() {
  return BAND_NAMES.map((name) => (
    <span className="octave-head" key={name} aria-hidden="true">
      {name}
    </span>
  ));
}

/** Seven figures, one an octave, with rows below common heads. */
export function OctaveFigures({
  rows,
}: {
  rows: { name: string; unit: string; values: ArrayLike<number>; digits?: number }[];
}) {
  if (rows.length === 0) return null;
  return (
    <table className="octave-table">
      <thead>
        <tr>
          <th scope="col">Hz</th>
          {BAND_NAMES.map((name) => (
            <th scope="col" key={name}>
              {name}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ name, unit, values, digits = 1 }) => (
          <tr key={name}>
            <th scope="row">
              {name} <span className="u">{unit}</span>
            </th>
            {NOMINAL_HZ.map((hz, band) => (
              <td key={hz}>{figure(values[band], digits)}</td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

export interface OctaveFieldsProps {
  /** Accessible name without the octave, such as "Absorption". */
  label: string;
  values: readonly number[];
  min: number;
  max: number;
  step: number;
  digits: number;
  /** Unit for messages and readers; the head says it once. */
  unit?: string;
  onChange: (band: number, value: number, phase: Phase) => void;
  onCancel: () => void;
}

/** Seven numbers to type, one an octave. */
export function OctaveFields({ label, values, unit = '', digits, onChange, ...shared }: OctaveFieldsProps) {
  return (
    <fieldset className="octave-fields" aria-label={label}>
      <OctaveHeads />
      {NOMINAL_HZ.map((hz, band) => (
        <QuantityField
          key={hz}
          {...shared}
          label={`${label} at ${octaveFigure(hz)}`}
          value={values[band]}
          digits={digits}
          format={(value) => figure(value, digits)}
          onChange={(value, phase) => value !== null && onChange(band, value, phase)}
        />
      ))}
      {unit !== '' && <span className="octave-unit u">{unit}</span>}
    </fieldset>
  );
}

/** A figure said in words: name, number, unit. */
export function Said({ what, children, unit }: { what: ReactNode; children: ReactNode; unit?: string }) {
  return (
    <>
      <dt>{what}</dt>
      <dd>
        {children}
        {unit !== undefined && <span className="u">{unit}</span>}
      </dd>
    </>
  );
}
