import { marginColour } from '../report/margin-colour';

/** How a seat stands, by shape as well as colour: a wedge edged in ink falls short, a square is served. */
export default function SeatMark({ marginDb }: { marginDb: number }) {
  const short = !(marginDb >= 0);
  const fill = marginColour(marginDb);
  return (
    <svg className="seats-mark" viewBox="-6 -6 12 12" role="img" aria-label={short ? 'short' : 'served'}>
      {short ? (
        <polygon className="seats-key short" points="-5,-4 5,-4 0,5" style={{ fill }} />
      ) : (
        <rect className="seats-key" x="-4.5" y="-4.5" width="9" height="9" style={{ fill }} />
      )}
    </svg>
  );
}
