import type { Layout } from '../layout/schema';
import { type Prediction, RUNGS } from '../predict/prediction';

/** Every figure of every seat and talker, one row each, as CSV (RFC 4180); empty where there is no finite number. */
export function seatsCsv(layout: Layout, prediction: Prediction): string {
  const head = [
    'scheme',
    'seat',
    'block',
    'talker',
    'own_seat',
    ...RUNGS.flatMap((rung) => [`${rung}_potential_dB`, `${rung}_needed_dB`, `${rung}_margin_dB`]),
    ...['unaided_dBA', 'system_dBA', 'total_dBA', 'signalToNoise_dB', 'directToReverberant_dB', 'arrivalGap_ms', 'sti'],
    'served_by',
  ];
  const rows = prediction.schemes.flatMap((scheme) =>
    prediction.seats.flatMap((seat, s) =>
      scheme.talkers.map((talker) => {
        const { room } = talker;
        return [
          scheme.id,
          seat.id,
          layout.venue.seating[seat.seating].label || layout.venue.seating[seat.seating].id,
          talker.id,
          talker.ownSeat[s] ? 'yes' : '',
          ...RUNGS.flatMap((rung) => {
            const { potentialDb, neededDb, marginDb } = talker.seats[rung];
            return [potentialDb[s], neededDb[s], marginDb[s]].map((value) => csvFigure(value));
          }),
          ...[room.unaidedDba, room.systemDba, room.totalDba, room.signalToNoiseDb, room.directToReverberantDb].map(
            (v) => csvFigure(v[s]),
          ),
          csvFigure(room.arrivalGapMs[s]),
          csvFigure(room.sti[s]),
          scheme.loudspeakerIds[room.servedBy[s]] ?? '',
        ];
      }),
    ),
  );
  return `${[head, ...rows].map((row) => row.map(csvCell).join(',')).join('\r\n')}\r\n`;
}

const csvFigure = (value: number): string => (Number.isFinite(value) ? String(Number(value.toFixed(4))) : '');

/** Quoted where it must be; a text that begins with = + - @ is kept from being taken for a formula. */
export function csvCell(value: string): string {
  const guarded = /^[=+\-@\t\r]/.test(value) && !/^-?\d+(\.\d+)?$/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded;
}
