import type { Knex } from 'knex';
import { beforeAll, describe, expect, test } from 'vitest';
import type { MeasurandEvaluation } from '@/lib/stats';
import { seedDemonstration } from '@/seeds/seed-demonstration';
import { testDatabase } from '../db/test-database';
import { meanOf, storedResults, storedScores, type StoredResult, type StoredScore } from './stored-scores';

let connection: Knex;
let scores: StoredScore[];
let results: StoredResult[];

beforeAll(async () => {
  connection = await testDatabase({ for: 'file' });
  await seedDemonstration(connection, { now: new Date('2026-12-01T10:00:00Z') });
  scores = await storedScores(connection);
  results = await storedResults(connection);
}, 120_000);

function scoreOf(laboratory: string, round: string, item: string, measurand: string): number {
  const found = scores.find(
    (entry) =>
      entry.laboratory === laboratory &&
      entry.round === round &&
      entry.item === item &&
      entry.measurand === measurand,
  );
  if (typeof found?.score !== 'number') throw new Error(`${laboratory} has no score in ${round}`);
  return found.score;
}

function resultsOf(laboratory: string, round: string): StoredResult[] {
  return results.filter((entry) => entry.laboratory === laboratory && entry.round === round);
}

function evaluationOf({ bodyJson }: StoredScore): MeasurandEvaluation {
  return JSON.parse(bodyJson) as MeasurandEvaluation;
}

/** Classes of the uncertainties a laboratory stated, by the stored evaluations. */
function uncertaintyClasses(laboratory: string): (string | null)[] {
  return scores
    .filter((entry) => entry.laboratory === laboratory && entry.value !== null)
    .map((entry) => {
      const own = evaluationOf(entry).scores.find(({ participant }) => participant === entry.participantCode);
      return own?.uncertaintyClass ?? null;
    });
}

describe('laboratories that do the same in every round', () => {
  test('the drifting laboratory rises from round to round and ends above 2', () => {
    const own = scores.filter(({ laboratory }) => laboratory === 'Selkey Lock Terminal');
    const rounds = [...new Set(own.map(({ round }) => round))];
    const means = rounds.map((name) =>
      meanOf(own.flatMap(({ round, score }) => (round === name && score !== null ? [score] : []))),
    );
    expect(rounds.length).toBeGreaterThanOrEqual(12);
    expect(means[0]).toBeLessThan(1);
    expect(means.at(-1)).toBeGreaterThan(2);
    const third = Math.floor(means.length / 3);
    const thirds = [means.slice(0, third), means.slice(third, 2 * third), means.slice(2 * third)].map(meanOf);
    expect(thirds[1]).toBeGreaterThan(thirds[0] ?? Number.NaN);
    expect(thirds[2]).toBeGreaterThan(thirds[1] ?? Number.NaN);
  });

  test('the rapid immunoaffinity method reads about a tenth above liquid chromatography', () => {
    const methodOf = new Map(results.map(({ laboratory, method }) => [laboratory, method]));
    const unslipped = scores.filter(
      ({ laboratory, round, measurand }) =>
        measurand === 'AFT' && round !== 'cereals-round-5' && laboratory !== 'Selkey Lock Terminal',
    );
    const relativeTo = (methods: readonly string[]) =>
      meanOf(
        unslipped.flatMap(({ laboratory, value, assigned }) =>
          value !== null && methods.includes(methodOf.get(laboratory) ?? '') ? [value / assigned] : [],
        ),
      );
    const bias = relativeTo(['IAF']) / relativeTo(['LC-FLD', 'LC-MSMS']) - 1;
    expect(bias).toBeGreaterThan(0.05);
    expect(bias).toBeLessThan(0.17);
  });

  test('one states far too small an uncertainty, one far too large, and some state none', () => {
    const small = uncertaintyClasses('Corrandale Analytical');
    expect(small.filter((name) => name === 'low').length / small.length).toBeGreaterThan(0.9);
    const large = uncertaintyClasses('Pellow Dairy');
    expect(large.filter((name) => name === 'high').length / large.length).toBeGreaterThan(0.9);
    expect(new Set(uncertaintyClasses('Dunmarrow Silo'))).toEqual(new Set([null]));
  });

  test('one is enrolled in every round and never sends', async () => {
    const row = await connection('enrolments')
      .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
      .leftJoin('submissions', 'submissions.enrolment_id', 'enrolments.id')
      .where({ 'laboratories.name': 'Garth Hill Grain Store', 'enrolments.state': 'enrolled' })
      .first(connection.raw('count(enrolments.id) as enrolled, count(submissions.id) as sent'));
    expect(row).toEqual({ enrolled: 15, sent: 0 });
  });
});

describe('slips', () => {
  test('a forgotten dilution step makes a result five times too low and its score an action signal', () => {
    expect(scoreOf('Brackwater Feeds', 'feed-round-6', 'F1', 'AFB1')).toBeLessThanOrEqual(-3);
    const slip = scores.find(
      ({ laboratory, round, measurand }) =>
        laboratory === 'Brackwater Feeds' && round === 'feed-round-6' && measurand === 'AFB1',
    );
    expect((slip?.value ?? 0) / (slip?.assigned ?? 1)).toBeCloseTo(1 / 5, 1);
  });

  test('a figure in mg/kg under the unit of the plan is a thousand times too low', () => {
    expect(scoreOf('Oxmere Mill', 'cereals-round-6', 'M1', 'FUM')).toBeLessThanOrEqual(-3);
    const [wrong] = resultsOf('Oxmere Mill', 'cereals-round-6').filter(
      ({ measurand }) => measurand === 'FUM',
    );
    expect(wrong?.ownUnit).toBe('ug/kg');
    expect(wrong?.value).toBeLessThan(5);
    const [right] = resultsOf('Oxmere Mill', 'cereals-round-5').filter(
      ({ measurand }) => measurand === 'FUM',
    );
    expect(right?.ownUnit).toBe('mg/kg');
    expect(right?.value).toBeGreaterThan(1000);
  });

  test.each(['Tolvers Quay Terminal', 'Marrick Vale Feeds'])('%s swapped the two items of maize', (name) => {
    for (const measurand of ['AFT', 'FUM']) {
      expect(scoreOf(name, 'cereals-round-5', 'M1', measurand)).toBeLessThanOrEqual(-3);
      expect(scoreOf(name, 'cereals-round-5', 'M2', measurand)).toBeGreaterThanOrEqual(3);
    }
    expect(Math.abs(scoreOf(name, 'cereals-round-5', 'W1', 'DON'))).toBeLessThan(2);
  });

  test('less-than and greater-than results are kept as written and not scored', () => {
    const greater = resultsOf('Ashlode Staithe Terminal', 'cereals-round-5').find(
      ({ kind }) => kind === 'above',
    );
    expect(greater).toMatchObject({ item: 'M1', measurand: 'FUM', resultText: '>5000', value: 5000 });
    const less = results.filter(({ kind }) => kind === 'below');
    expect(less.some(({ resultText }) => resultText === '<LOQ')).toBe(true);
    expect(less.some(({ resultText }) => /^<\d/.test(resultText))).toBe(true);
    const censored = scores.filter(({ value }) => value === null);
    expect(censored.length).toBeGreaterThan(10);
    expect(new Set(censored.map(({ signal }) => signal))).toEqual(new Set(['not-scored']));
  });

  test('one wrote the same replicates twice, others did not', () => {
    const differences = (name: string) => {
      const own = resultsOf(name, 'cereals-round-6');
      const firsts = own.filter(({ replicate }) => replicate === 1);
      return firsts.map((first) => {
        const second = own.find(
          ({ item, measurand, replicate }) =>
            item === first.item && measurand === first.measurand && replicate === 2,
        );
        return (second?.value ?? Number.NaN) - (first.value ?? Number.NaN);
      });
    };
    expect(differences('Saltby Fold Feeds').length).toBeGreaterThan(3);
    expect(new Set(differences('Saltby Fold Feeds'))).toEqual(new Set([0]));
    expect(differences('Oxmere Mill').some((difference) => difference !== 0)).toBe(true);
  });

  test('one could not measure and gave the reason', () => {
    const [row] = results.filter(({ kind }) => kind === 'not-measured');
    expect(row).toMatchObject({ laboratory: 'Kettlesing Flour', value: null });
    expect(row?.comment).toContain('out of service');
  });

  test('the closed round holds slips that wait for review', () => {
    const valueOf = (name: string, item: string, measurand: string) =>
      resultsOf(name, 'feed-round-7').find(
        (entry) => entry.item === item && entry.measurand === measurand && entry.replicate === 1,
      )?.value ?? Number.NaN;
    const usual = valueOf('Oxmere Mill', 'F1', 'AFB1');
    expect(valueOf('Wendle Roller Mill', 'F1', 'AFB1') / usual).toBeLessThan(0.4);
    expect(valueOf('Birchlow Testing', 'F1', 'DON')).toBeLessThan(5);
    expect(valueOf('Orrowby Premix', 'F1', 'AFB1')).toBeLessThan(valueOf('Orrowby Premix', 'F2', 'AFB1'));
  });
});

describe('enrolments and amendments', () => {
  const enrolment = (laboratory: string, round: string) =>
    connection('enrolments')
      .join('laboratories', 'laboratories.id', 'enrolments.laboratory_id')
      .join('rounds', 'rounds.id', 'enrolments.round_id')
      .where({ 'laboratories.name': laboratory, 'rounds.slug': round })
      .first('enrolments.*');

  test('one withdrew after sending and is not scored; one declined', async () => {
    const withdrawn = await enrolment('Eastrow Maltings', 'feed-round-5');
    expect(withdrawn).toMatchObject({ state: 'withdrawn', reason: expect.stringContaining('Flood') });
    expect(resultsOf('Eastrow Maltings', 'feed-round-5').length).toBeGreaterThan(0);
    expect(
      scores.some(({ laboratory, round }) => laboratory === 'Eastrow Maltings' && round === 'feed-round-5'),
    ).toBe(false);
    expect(await enrolment('Vannet Creamery', 'cereals-round-6')).toMatchObject({ state: 'declined' });
  });

  test('amended files are kept, each replacing the one before', async () => {
    const { id } = await enrolment('Nether Wyle Mill', 'cereals-round-6');
    const files = await connection('submissions').where({ enrolment_id: id }).orderBy('id');
    expect(files.map(({ state }) => state)).toEqual(['superseded', 'superseded', 'submitted']);
    expect(files.map(({ supersedes_id }) => supersedes_id)).toEqual([null, files[0].id, files[1].id]);
    const all = await connection('submissions').where({ state: 'superseded' });
    const replacing = await connection('submissions').whereNotNull('supersedes_id').select('upload_id');
    const uploads = [...all, ...replacing].map(({ upload_id }) => upload_id);
    // The file in the middle of three is both replaced and replacing.
    expect(new Set(uploads).size).toBe(uploads.length - 1);
    expect(all.length).toBeGreaterThanOrEqual(5);
  });
});
