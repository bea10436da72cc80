import { useSchemePrediction } from '../session/session';
import { OctaveFigures } from './Fields';

/** Directivity index of a model by octave, once it has been predicted. */
export function Directivity({ model }: { model: string }) {
  const index = useSchemePrediction()?.models.find((candidate) => candidate.id === model)?.directivityIndexDb;
  if (index === undefined) return null;
  return (
    <section className="item-section" aria-label="Directivity">
      <h3>Directivity index</h3>
      <OctaveFigures rows={[{ name: 'DI', unit: 'dB', values: index }]} />
    </section>
  );
}
