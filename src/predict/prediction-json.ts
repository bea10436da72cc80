import { BAND_COUNT, NOMINAL_HZ } from '../acoustics/bands';
import { jsonFigure as figure, jsonFigures as figures } from '../formats/figure';
import type { Layout } from '../layout/schema';
import type { Prediction, RungLoop, RungSeats, SchemePrediction, TalkerPrediction } from './prediction';

/** The prediction as the JSON contract says: keys carry their units, null means no finite number. */
export function predictionJson(layout: Layout, prediction: Prediction): object {
  const { venue } = prediction;
  return {
    format: 'gainwright-prediction',
    version: 1,
    layout: layout.name,
    venue: {
      volume_m3: figure(venue.volumeM3),
      surface_m2: figure(venue.surfaceM2),
      decay_s: figures(venue.decayS),
      roomConstant_m2: figures(venue.roomConstantM2),
      air_dB_per_m: figures(venue.airDbPerM),
      soundSpeed_m_s: figure(venue.soundSpeedMS),
      noise_dBA: figure(venue.noiseDba),
    },
    schemes: prediction.schemes.map((scheme) => schemeJson(prediction, scheme)),
  };
}

function schemeJson(prediction: Prediction, scheme: SchemePrediction): object {
  return {
    id: scheme.id,
    models: scheme.models.map((model) => ({ id: model.id, directivityIndex_dB: figures(model.directivityIndexDb) })),
    talkers: scheme.talkers.map((talker) => talkerJson(prediction, scheme, talker)),
    seats: prediction.seats.map((seat, s) => {
      const talker = scheme.talkers[scheme.worstTalker[s]];
      return {
        id: seat.id,
        worstTalker: talker?.id ?? null,
        margin_dB: figure(scheme.worstMarginDb[s]),
        sti: figure(talker?.room.sti[s] ?? null),
      };
    }),
    uniformity: scheme.talkers.map((talker) => ({
      talker: talker.id,
      spread_dB: figure(talker.uniformity.spreadDb),
      deviation_dB: figure(talker.uniformity.deviationDb),
    })),
  };
}

function talkerJson(prediction: Prediction, scheme: SchemePrediction, talker: TalkerPrediction): object {
  const { working } = talker;
  return {
    id: talker.id,
    loop: {
      distance: {
        limit_dB: figure(talker.loop.distance.limitDb),
        idleLimit_dB: figure(talker.loop.distance.idleLimitDb),
        openMicrophoneCost_dB: figure(talker.loop.distance.openMicrophoneCostDb),
      },
      directivity: loopJson(scheme, talker.loop.directivity),
      room: {
        ...loopJson(scheme, talker.loop.room),
        workingGain_dB: figure(working.workingGainDb),
        regeneration_dB: figure(working.regenerationDb),
        peakAllowance_dB: figure(working.peakAllowanceDb),
        belowPeakAllowance: working.belowPeakAllowance,
      },
    },
    seats: prediction.seats.map((seat, s) => seatJson(seat.id, seat.ear, talker, s)),
    headroom: scheme.loudspeakerIds.map((loudspeaker, l) => ({
      loudspeaker,
      level_dB: figure(talker.headroom[l].levelDb),
      headroom_dB: figure(talker.headroom[l].headroomDb),
      power_W: figure(talker.headroom[l].powerW),
    })),
    delays: scheme.loudspeakerIds.map((loudspeaker, l) => ({
      loudspeaker,
      proposed_ms: figure(talker.proposedDelayMs[l]),
    })),
  };
}

function loopJson(scheme: SchemePrediction, loop: RungLoop): object {
  const L = scheme.loudspeakerIds.length;
  return {
    limit_dB: figure(loop.limitDb),
    idleLimit_dB: figure(loop.idleLimitDb),
    openMicrophoneCost_dB: figure(loop.openMicrophoneCostDb),
    bandLimits_dB: figures(loop.bandLimitsDb),
    limitingBand_Hz: loop.limitingBand < 0 ? null : NOMINAL_HZ[loop.limitingBand],
    crosspoints: scheme.microphoneIds.flatMap((microphone, m) =>
      scheme.loudspeakerIds.map((loudspeaker, l) => ({
        microphone,
        loudspeaker,
        share: figure(loop.crosspoints?.[m * L + l] ?? null),
      })),
    ),
  };
}

function seatJson(id: string, position: readonly number[], talker: TalkerPrediction, s: number): object {
  const { room } = talker;
  const rung = (seats: RungSeats) => ({
    potential_dB: figure(seats.potentialDb[s]),
    needed_dB: figure(seats.neededDb[s]),
    margin_dB: figure(seats.marginDb[s]),
  });
  return {
    id,
    position: figures(position),
    distance: rung(talker.seats.distance),
    directivity: rung(talker.seats.directivity),
    room: {
      ...rung(talker.seats.room),
      unaided_dBA: figure(room.unaidedDba[s]),
      system_dBA: figure(room.systemDba[s]),
      total_dBA: figure(room.totalDba[s]),
      total_dB: figures(room.totalDb.subarray(s * BAND_COUNT, (s + 1) * BAND_COUNT)),
      signalToNoise_dB: figure(room.signalToNoiseDb[s]),
      directToReverberant_dB: figure(room.directToReverberantDb[s]),
      arrivalGap_ms: figure(room.arrivalGapMs[s]),
      sti: figure(room.sti[s]),
    },
  };
}
