import { useMemo } from 'react';
import { findModel } from '../layout/catalogue';
import type { Ref } from '../layout/ref';
import type { DeviceModel, Layout, Loudspeaker, Microphone, Scheme } from '../layout/schema';
import type { Prediction, SchemePrediction } from '../predict/prediction';
import { type Quantity, quantityOf } from '../report/quantities';
import type { Units } from '../report/units';
import { useLayout, useScheme, useSchemePrediction, useSession } from '../session/session';
import { type RoomShape, roomShape } from './room-shape';
import { type SeatFigures, seatFigures } from './seat-figures';
import { type SeatPlace, seatPlaces } from './seat-places';
import { type ThemeColours, useThemeColours } from './theme-colours';

/** Everything the drawing is made from, derived from the session and kept while that does not change. */
export interface RoomScene {
  layout: Layout;
  scheme: Scheme;
  shape: RoomShape;
  seats: readonly SeatPlace[];
  seatIndex: ReadonlyMap<string, number>;
  figures: SeatFigures;
  quantity: Quantity;
  prediction: Prediction | null;
  predicted: SchemePrediction | null;
  talkerId: string | null;
  units: Units;
  colours: ThemeColours;
  selection: Ref | null;
  loudspeakers: readonly Placed<Loudspeaker>[];
  microphones: readonly Placed<Microphone>[];
}

export interface Placed<Device> {
  device: Device;
  pattern: DeviceModel['pattern'] | undefined;
}

export function useRoomScene(): RoomScene {
  const layout = useLayout();
  const scheme = useScheme();
  const prediction = useSession((session) => session.prediction);
  const predicted = useSchemePrediction();
  const talkerId = useSession((session) => session.talkerId);
  const quantity = quantityOf(useSession((session) => session.quantity));
  const units = useSession((session) => session.units);
  const selection = useSession((session) => session.selection);
  const colours = useThemeColours();
  const { faces, finishes, seating, talkers } = layout.venue;
  const { models } = layout;
  const shape = useMemo(() => roomShape({ faces, finishes }), [faces, finishes]);
  const seats = useMemo(() => seatPlaces({ seating, talkers, faces }), [seating, talkers, faces]);
  const seatIndex = useMemo(() => new Map(seats.map((seat, index) => [seat.id, index])), [seats]);
  const figures = useMemo(
    () => seatFigures(seats, prediction, predicted, talkerId, quantity),
    [seats, prediction, predicted, talkerId, quantity],
  );
  const loudspeakers = useMemo(
    () =>
      scheme.loudspeakers.map((device) => ({
        device,
        pattern: findModel({ models } as Layout, device.model, 'loudspeaker')?.pattern,
      })),
    [scheme.loudspeakers, models],
  );
  const microphones = useMemo(
    () =>
      scheme.microphones.map((device) => ({
        device,
        pattern: findModel({ models } as Layout, device.model, 'microphone')?.pattern,
      })),
    [scheme.microphones, models],
  );
  return useMemo(
    () => ({
      layout,
      scheme,
      shape,
      seats,
      seatIndex,
      figures,
      quantity,
      prediction,
      predicted,
      talkerId,
      units,
      colours,
      selection,
      loudspeakers,
      microphones,
    }),
    [
      layout,
      scheme,
      shape,
      seats,
      seatIndex,
      figures,
      quantity,
      prediction,
      predicted,
      talkerId,
      units,
      colours,
      selection,
      loudspeakers,
      microphones,
    ],
  );
}
