import { createBoundary } from './boundary';
import { createCapOnSphere } from './cap-on-sphere';
import { createColumn } from './column';
import { createFirstOrder } from './first-order';
import { createFlushPiston } from './flush-piston';
import { createHorn } from './horn';
import type { Pattern, PatternSpec } from './pattern';
import { createPoint } from './point';
import { createSpeech } from './speech';
import { createTable } from './table';
import { createTube } from './tube';

/**
 * The pattern a specification describes; the specification has been validated.
 *
 * Interference patterns take some milliseconds to sample here, after which `powers` allocates nothing: keep the
 * pattern while specification and speed of sound stay the same.
 */
export function createPattern(spec: PatternSpec, soundSpeedMS: number): Pattern {
  switch (spec.type) {
    case 'point':
      return createPoint();
    case 'speech':
      return createSpeech();
    case 'first-order':
      return createFirstOrder(spec.alpha);
    case 'tube':
      return createTube(spec.length, soundSpeedMS);
    case 'boundary':
      return createBoundary();
    case 'cap-on-sphere':
      return createCapOnSphere(spec.sphere, spec.cap, soundSpeedMS);
    case 'horn':
      return createHorn(spec.horizontal, spec.vertical, spec.mouthWidth, spec.mouthHeight);
    case 'column':
      return createColumn(
        {
          drivers: spec.drivers,
          spacingM: spec.spacing,
          steerRad: (spec.steer * Math.PI) / 180,
          sphereDiameterM: spec.sphere,
          capDiameterM: spec.cap,
        },
        soundSpeedMS,
      );
    case 'flush-piston':
      return createFlushPiston(spec.diameter, soundSpeedMS);
    case 'table':
      return createTable(spec);
  }
}
