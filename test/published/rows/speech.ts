import weighting from '../../../data/reference/a-weighting.json';
import table from '../../../data/reference/speech-levels.json';
import { NOMINAL_HZ } from '../../../src/acoustics/bands';
import { aWeightedDb, dbOfPower, powerOfDb } from '../../../src/acoustics/level';
import { SPEECH_SPECTRUM_DB, talkerLevelsDb, VOCAL_EFFORT_DBA } from '../../../src/acoustics/speech/spectra';
import type { PublishedRow } from '../row';

const spectrum: PublishedRow[] = table.maleSpectrum.reBand500Db.map((value, band) => ({
  quantity: `male speech at ${NOMINAL_HZ[band]} Hz re 500 Hz`,
  compute: () => talkerLevelsDb(60)[band] - talkerLevelsDb(60)[2],
  value,
  tolerance: 1e-9,
  unit: 'dB',
  source: table.maleSpectrum.origin,
}));

const { normal, raised, loud, 'very-loud': veryLoud } = table.vocalEffort.dba;
const efforts: PublishedRow[] = (
  [
    ['relaxed', table.vocalEffortRelaxed.dba, table.vocalEffortRelaxed.origin],
    ['normal', normal, table.vocalEffort.origin],
    ['raised', raised, table.vocalEffort.origin],
    ['loud', loud, table.vocalEffort.origin],
    ['very-loud', veryLoud, table.vocalEffort.origin],
  ] as const
).map(([effort, value, source]) => ({
  quantity: `level of ${effort} speech at 1 m`,
  compute: () => aWeightedDb(talkerLevelsDb(VOCAL_EFFORT_DBA[effort])),
  value,
  tolerance: 1e-9,
  unit: 'dBA',
  source,
}));

/** Another survey, another decade: normal speech of the two agrees within 3.5 dB a band (250 Hz differs most). */
const survey: PublishedRow[] = table.thirdOctaves.efforts[0].octavesDb.map((value, column) => ({
  quantity: `normal speech at ${NOMINAL_HZ[column + 1]} Hz against another survey at the same dBA`,
  compute: () => talkerLevelsDb(table.thirdOctaves.efforts[0].dba)[column + 1],
  value,
  tolerance: 3.5,
  unit: 'dB',
  source: `${table.thirdOctaves.origin}, summed to octaves`,
}));

export const rows: PublishedRow[] = [
  ...spectrum,
  {
    quantity: 'A-weighted sum of the male spectrum, weights rounded to 0.1 dB',
    compute: () => roundedWeightsDb(SPEECH_SPECTRUM_DB),
    value: 0.02,
    tolerance: 0.005,
    unit: 'dB',
    source: 'recomputed from IEC 60268-16:2020, A.6.1',
  },
  {
    // The unrounded weights of the program take 0.02 dB off the sum with rounded ones.
    quantity: 'A-weighted sum of the male spectrum, weights at exact centres',
    compute: () => aWeightedDb(SPEECH_SPECTRUM_DB),
    value: 0,
    tolerance: 0.001,
    unit: 'dB',
    source: 'closed form: IEC 60268-16:2020, A.6.1 weighted by IEC 61672-1:2013, E.4.2',
  },
  {
    quantity: 'unweighted sum of the male spectrum as printed',
    compute: () => dbOfPower(SPEECH_SPECTRUM_DB.reduce((sum, levelDb) => sum + powerOfDb(levelDb), 0)),
    value: 4.8,
    tolerance: 0.005,
    unit: 'dB',
    source: 'recomputed from IEC 60268-16:2020, A.6.1',
  },
  {
    quantity: 'A-weighted sum of the fourth edition’s male spectrum, weights rounded to 0.1 dB',
    compute: () => roundedWeightsDb(table.maleSpectrumFourthEdition.reAWeightedDb),
    value: 0.05,
    tolerance: 0.005,
    unit: 'dB',
    source: 'recomputed from IEC 60268-16:2011',
  },
  ...efforts,
  ...survey,
];

function roundedWeightsDb(levelsDb: readonly number[]): number {
  const weightsDb = weighting.weightDb.slice(1);
  return dbOfPower(levelsDb.reduce((sum, levelDb, band) => sum + powerOfDb(levelDb + weightsDb[band]), 0));
}
