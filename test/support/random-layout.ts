import fc from 'fast-check';
import type { Layout, Vec3 } from '../../src/layout/schema';
import { box, flat, loudspeaker, microphone, panel, scheme, smallLayout, talker } from './layouts';

export const ROOM: Vec3 = [8, 6, 3];

const inRoom = fc.tuple(
  fc.double({ min: 0.3, max: 7.7, noNaN: true }),
  fc.double({ min: 0.3, max: 5.7, noNaN: true }),
  fc.double({ min: 0.3, max: 2.7, noNaN: true }),
) as fc.Arbitrary<Vec3>;
const turn = fc.double({ min: -180, max: 180, noNaN: true });
const tilt = fc.double({ min: -80, max: 80, noNaN: true });

const microphones = fc.array(
  fc.record({
    position: inRoom,
    pan: turn,
    tilt,
    roll: turn,
    model: fc.constantFrom('omni', 'cardioid', 'hypercardioid'),
  }),
  { minLength: 1, maxLength: 3 },
);
const loudspeakers = fc.array(
  fc.record({
    position: inRoom,
    pan: turn,
    tilt,
    roll: turn,
    model: fc.constantFrom('point', 'box-small', 'horn-90x40'),
    delay: fc.double({ min: 0, max: 30, noNaN: true }),
  }),
  { minLength: 1, maxLength: 3 },
);

/** Rooms with a talker, some devices and listed seats at random places; the wall and the panel of one finish. */
export const randomLayout: fc.Arbitrary<Layout> = fc
  .record({
    absorption: fc.double({ min: 0.02, max: 0.9, noNaN: true }),
    order: fc.integer({ min: 0, max: 2 }),
    screen: fc.boolean(),
    talker: fc.record({ position: inRoom, pan: turn, tilt }),
    seats: fc.array(inRoom, { minLength: 1, maxLength: 3 }),
    automix: fc.constantFrom('off' as const, 'gain-sharing' as const),
    microphones,
    loudspeakers,
  })
  .map((made) => {
    const layout = smallLayout();
    layout.venue.finishes[0].absorption = flat(made.absorption);
    layout.venue.reflectionOrder = made.order;
    layout.venue.faces = [...box(...ROOM), ...(made.screen ? [panel(3.9, 1.1, 3.3, 1.7)] : [])];
    layout.venue.talkers = [talker('t', made.talker.position, made.talker)];
    layout.venue.seating = [
      {
        id: 'S',
        label: '',
        kind: 'list',
        earHeight: 0,
        seats: made.seats.map((position, i) => ({ id: `S${i}`, position })),
      },
    ];
    layout.schemes = [
      scheme('A', {
        microphones: made.microphones.map((m, i) => microphone(`m${i}`, m.position, m)),
        loudspeakers: made.loudspeakers.map((l, i) => loudspeaker(`l${i}`, l.position, l)),
      }),
    ];
    layout.schemes[0].system.automix = made.automix;
    return layout;
  });
