import { describe, expect, it } from 'vitest';
import type { LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { getDesk, sortDesk } from '@/lib/services/laboratory-desk';
import { confirmReceipt } from '@/lib/services/enrolments';
import { testDatabase } from '../db/test-database';
import { at, csvOf, openWithManagers, publish, send } from './laboratory-fixture';
import { addLaboratory } from './people-fixture';

const NOW = '2026-12-01T08:00:00.000Z';

function roundOf(change: Partial<LaboratoryRound>): LaboratoryRound {
  return {
    id: 1,
    slug: 'r',
    schemeId: 1,
    name: 'Round',
    state: 'open',
    isPast: false,
    opensAt: '2026-11-01T08:00:00.000Z',
    dispatchAt: '2026-11-10T08:00:00.000Z',
    closesAt: '2026-12-10T08:00:00.000Z',
    publishAt: '2026-12-20T08:00:00.000Z',
    instructions: '',
    feeCents: 0,
    feeCurrency: 'EUR',
    openedAt: null,
    closedAt: null,
    evaluatedAt: null,
    publishedAt: null,
    cancelledAt: null,
    cancelReason: null,
    createdBy: null,
    createdAt: '2026-10-01T08:00:00.000Z',
    schemeName: 'Mycotoxins',
    participantCode: '1234',
    enrolmentState: 'enrolled',
    enrolledAt: '2026-10-02T08:00:00.000Z',
    decidedAt: null,
    itemsReceivedAt: null,
    receiptCode: null,
    submittedAt: null,
    ...change,
  };
}

function placesOf(change: Partial<LaboratoryRound>): string[] {
  const desk = sortDesk([roundOf(change)], [], NOW);
  return Object.entries(desk).flatMap(([place, rounds]) => (rounds.length > 0 ? [place] : []));
}

describe('where a round stands on the desk', () => {
  it.each<[string, Partial<LaboratoryRound>, string[]]>([
    ['an invitation', { enrolmentState: 'invited' }, ['invitations']],
    ['an invitation to a planned round', { enrolmentState: 'invited', state: 'draft' }, ['invitations']],
    ['an invitation after the close', { enrolmentState: 'invited', state: 'closed' }, ['underWay']],
    ['items on their way', {}, ['toReceive', 'due']],
    ['items that have not left', { dispatchAt: '2026-12-02T08:00:00.000Z' }, ['due']],
    ['items here', { itemsReceivedAt: NOW }, ['due']],
    ['results sent', { itemsReceivedAt: NOW, receiptCode: 'x' }, ['underWay']],
    ['results sent, items not confirmed', { receiptCode: 'x' }, ['toReceive']],
    ['the time has passed', { closesAt: '2026-11-30T08:00:00.000Z' }, ['underWay']],
    ['being planned', { state: 'draft' }, ['underWay']],
    ['under review', { state: 'evaluated', receiptCode: 'x' }, ['underWay']],
    ['just published', { state: 'published', publishedAt: '2026-11-28T08:00:00.000Z' }, ['newlyPublished']],
    ['published long ago', { state: 'published', publishedAt: '2026-09-01T08:00:00.000Z' }, ['past']],
    ['loaded as a past round', { state: 'published', publishedAt: NOW, isPast: true }, ['past']],
    ['declined', { enrolmentState: 'declined' }, ['past']],
    [
      'withdrawn, then published',
      { enrolmentState: 'withdrawn', state: 'published', publishedAt: NOW },
      ['past'],
    ],
    ['cancelled', { state: 'cancelled' }, ['past']],
  ])('%s', (_, change, places) => {
    expect(placesOf(change)).toEqual(places);
  });

  it('puts what is due first at the top', () => {
    const later = roundOf({ id: 2, slug: 'later', closesAt: '2026-12-30T08:00:00.000Z' });
    const sooner = roundOf({ id: 3, slug: 'sooner' });
    expect(sortDesk([later, sooner], [], NOW).due.map(({ slug }) => slug)).toEqual(['sooner', 'later']);
  });
});

it("follows a laboratory's own round through its life, with its own signals at the end", async () => {
  const db = await testDatabase();
  const open = await openWithManagers(db, 5);
  const { actor, laboratoryId } = at(open, 4);
  const desk = () => getDesk(laboratoryId, new Date().toISOString());
  expect((await desk()).toReceive).toHaveLength(1);
  await confirmReceipt(actor, open.round, laboratoryId);
  expect((await desk()).toReceive).toHaveLength(0);
  expect((await desk()).due).toHaveLength(1);
  for (const [place, value] of ['8.0', '8.4', '8.8', '9.0', '20'].entries()) {
    await send(open, place, csvOf(value));
  }
  expect((await desk()).underWay).toMatchObject([{ name: 'Maize 1' }]);
  await publish(db, open);
  expect((await desk()).newlyPublished).toMatchObject([
    { name: 'Maize 1', signals: { action: 1, warning: 0, none: 0 } },
  ]);
  const stranger = await addLaboratory(db, 'Elsewhere');
  const empty = await getDesk(stranger, new Date().toISOString());
  expect(Object.values(empty).flat()).toEqual([]);
});
