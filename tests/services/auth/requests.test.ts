import type { Knex } from 'knex';
import { beforeEach, describe, expect, it } from 'vitest';
import { authorise } from '@/lib/auth/authorise';
import { sealSessionId } from '@/lib/auth/cookie';
import { actorFromRequest } from '@/lib/auth/request';
import { addToken, listTokens, MOST_TOKENS, revokeToken } from '@/lib/services/tokens';
import { testDatabase } from '../../db/test-database';
import { actorOf, addLaboratory, addPerson, logOf, newActor } from '../people-fixture';

const ADDRESS = 'http://127.0.0.1:3000/api/rounds/a/results';

let db: Knex;
let mill: number;

beforeEach(async () => {
  db = await testDatabase();
  mill = await addLaboratory(db, 'Lower Mill');
});

function request(method: string, headers: Record<string, string>): Request {
  return new Request(ADDRESS, { method, headers: { host: '127.0.0.1:3000', ...headers } });
}

async function cookieOf(userId: number): Promise<string> {
  const { sessionId } = await actorOf(db, userId);
  return `assize_theme=dark; next-auth.session-token=${await sealSessionId(sessionId)}; other=1`;
}

describe('a cookie', () => {
  let cookie: string;

  beforeEach(async () => {
    cookie = await cookieOf(await addPerson(db, { name: 'Bo Miller', roles: [['analyst', mill]] }));
  });

  it('names the person', async () => {
    expect(await actorFromRequest(request('GET', { cookie }))).toMatchObject({ name: 'Bo Miller' });
    expect(await actorFromRequest(request('GET', {}))).toBeNull();
    expect(await actorFromRequest(request('GET', { cookie: 'x-next-auth.session-token=1' }))).toBeNull();
  });

  it.each([
    [{ 'sec-fetch-site': 'same-origin' }],
    [{ origin: 'http://127.0.0.1:3000' }],
    [{ 'sec-fetch-site': 'same-origin', origin: 'http://127.0.0.1:3000' }],
    [{}],
  ])('may change things from the own pages, %j', async (headers) => {
    expect(await actorFromRequest(request('POST', { cookie, ...headers }))).toMatchObject({
      name: 'Bo Miller',
    });
  });

  it.each([
    [{ 'sec-fetch-site': 'cross-site' }],
    [{ 'sec-fetch-site': 'same-site' }],
    [{ 'sec-fetch-site': 'none' }],
    [{ origin: 'http://elsewhere.example' }],
    [{ origin: 'http://127.0.0.1:3999' }],
    [{ origin: 'null' }],
  ])('changes nothing from another site, %j', async (headers) => {
    await expect(actorFromRequest(request('POST', { cookie, ...headers }))).rejects.toMatchObject({
      code: 'forbidden',
    });
  });
});

describe('a token', () => {
  const input = { name: 'LIMS', expiresOn: '2027-06-30' };

  async function makeToken(): Promise<{ id: number; token: string }> {
    return addToken(await newActor(db, { name: 'Mo Weir', roles: [['lab_manager', mill]] }), input);
  }

  function bearer(token: string): Promise<Awaited<ReturnType<typeof actorFromRequest>>> {
    return actorFromRequest(request('POST', { authorization: `Bearer ${token}`, origin: 'null' }));
  }

  it('is 40 random characters behind a prefix, and kept as a hash', async () => {
    const { token } = await makeToken();
    expect(token).toMatch(/^assize_[0-9A-Za-z]{40}$/);
    const stored = await db('api_tokens').first();
    expect(stored).toMatchObject({ last_four: token.slice(-4), expires_at: '2027-06-30T23:59:59.999Z' });
    expect(stored.token_hash).toMatch(/^[0-9a-f]{64}$/);
    expect(JSON.stringify(await logOf(db))).not.toContain(token.slice(7));
  });

  it('acts as an analyst of its laboratory', async () => {
    const { id, token } = await makeToken();
    expect(await bearer(token)).toEqual({
      userId: null,
      apiTokenId: id,
      name: 'LIMS',
      email: '',
      memberships: [{ role: 'analyst', laboratoryId: mill, laboratoryName: 'Lower Mill' }],
      laboratoryId: mill,
    });
  });

  it('notes its use at most once a minute', async () => {
    const { id, token } = await makeToken();
    const usedAt = async () => (await db('api_tokens').where({ id }).first()).last_used_at;
    await bearer(token);
    const first = await usedAt();
    expect(first).toEqual(expect.any(String));
    await bearer(token);
    expect(await usedAt()).toBe(first);
    await db('api_tokens')
      .where({ id })
      .update({ last_used_at: new Date(Date.now() - 61_000).toISOString() });
    await bearer(token);
    expect((await usedAt()) >= first).toBe(true);
  });

  it('is worth nothing when revoked, expired, unknown or of a laboratory that is not active', async () => {
    const actor = await newActor(db, { name: 'Mo Weir', roles: [['lab_manager', mill]] });
    const [one, two, three] = [
      await addToken(actor, input),
      await addToken(actor, input),
      await addToken(actor, input),
    ];
    await revokeToken(actor, one.id);
    expect(await bearer(one.token)).toBeNull();
    await db('api_tokens').where({ id: two.id }).update({ expires_at: '2020-01-01T00:00:00.000Z' });
    expect(await bearer(two.token)).toBeNull();
    expect(await bearer(`${three.token.slice(0, -1)}!`)).toBeNull();
    await db('laboratories').where({ id: mill }).update({ is_active: false });
    expect(await bearer(three.token)).toBeNull();
  });

  it('is one of a limited number in force', async () => {
    const actor = await newActor(db, { name: 'Mo Weir', roles: [['lab_manager', mill]] });
    const first = await addToken(actor, input);
    for (let count = 1; count < MOST_TOKENS; count += 1) await addToken(actor, input);
    await expect(addToken(actor, input)).rejects.toMatchObject({ code: 'conflict' });
    await revokeToken(actor, first.id);
    await expect(addToken(actor, input)).resolves.toMatchObject({ name: 'LIMS' });
  });

  it('that is wrong is not made good by a cookie beside it', async () => {
    const cookie = await cookieOf(await addPerson(db, { name: 'Bo Miller', roles: [['analyst', mill]] }));
    for (const authorization of ['Bearer wrong', 'Bearer', 'Basic YTpi', '']) {
      expect(await actorFromRequest(request('GET', { cookie, authorization }))).toBeNull();
    }
  });

  it('of another laboratory can be neither seen nor revoked', async () => {
    const { id, token } = await makeToken();
    const harbour = await addLaboratory(db, 'Harbour');
    const stranger = await newActor(db, { name: 'Hal Pier', roles: [['lab_manager', harbour]] });
    expect(await listTokens(stranger)).toEqual([]);
    await expect(revokeToken(stranger, id)).rejects.toMatchObject({ code: 'not-found' });
    expect(await bearer(token)).not.toBeNull();
  });
});

describe('authorise', () => {
  it('lets through what the rules allow and writes nothing', async () => {
    const actor = await newActor(db, { name: 'Bo Miller', roles: [['analyst', mill]] });
    expect(await authorise(actor, 'own:submit', { laboratoryId: mill })).toBe(actor);
    expect(await logOf(db)).toEqual([]);
  });

  it('answers not-signed-in, forbidden or not-found, and logs the last two', async () => {
    const harbour = await addLaboratory(db, 'Harbour');
    const actor = await newActor(db, { name: 'Bo Miller', roles: [['analyst', mill]] });
    const code = (expected: string) => ({ code: expected });
    await expect(authorise(null, 'round:view')).rejects.toMatchObject(code('not-signed-in'));
    await expect(authorise(actor, 'round:view')).rejects.toMatchObject(code('forbidden'));
    await expect(authorise(actor, 'own:people', { laboratoryId: mill })).rejects.toMatchObject(
      code('forbidden'),
    );
    await expect(authorise(actor, 'own:view', { laboratoryId: harbour })).rejects.toMatchObject(
      code('not-found'),
    );
    await expect(authorise(actor, 'own:view', { laboratoryId: 9_999 })).rejects.toMatchObject(
      code('not-found'),
    );
    await expect(authorise(actor, 'round:view', {}, { hiddenAs: 'The round' })).rejects.toMatchObject(
      code('not-found'),
    );
    expect(await logOf(db)).toMatchObject([
      { action: 'round:view', outcome: 'refused', user_id: actor.userId, laboratory_id: mill },
      { action: 'own:people', detail: `laboratory ${mill}` },
      { action: 'own:view', detail: `laboratory ${harbour}` },
      { action: 'own:view', detail: 'laboratory 9999' },
      { action: 'round:view' },
    ]);
  });
});
