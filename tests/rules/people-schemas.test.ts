import { expect, it } from 'vitest';
import { invitePersonSchema } from '@/lib/schemas/people';
import { newLaboratorySchema } from '@/lib/schemas/laboratories';
import { emailText, passwordComplaint, setUpSchema } from '@/lib/schemas/sign-in';
import { lastTokenDay, newTokenSchema } from '@/lib/schemas/tokens';

const owner = { name: 'Ada Brook the Elder', email: 'ada.brook@provider.example' };

it.each([
  ['short', /at least 12 characters; this has 5/],
  ['password1234', /guessed first/],
  ['PASSWORD1234', /guessed first/],
  ['aaaaaaaaaaaaaaaa', /5 different characters/],
  ['ada.brook@provider.example', /other than your e-mail or name/],
  ['Ada Brook the Elder', /other than your e-mail or name/],
  ['x'.repeat(201), /at most 200/],
])('refuses the password %s', (password, complaint) => {
  expect(passwordComplaint(password, owner)).toMatch(complaint);
});

it.each(['grain dust and rivers', 'Tz7#kk02!mmQ', 'mühle am langen fluss'])(
  'takes the password %s',
  (password) => {
    expect(passwordComplaint(password, owner)).toBeNull();
  },
);

it('writes e-mail addresses in small letters', () => {
  expect(emailText.parse('  Ada@Provider.Example ')).toBe('ada@provider.example');
  expect(emailText.safeParse('ada').error?.issues[0]?.message).toMatch(/such as name@/);
});

it('asks for a role or a laboratory when someone is invited', () => {
  const person = { name: 'Bo', email: 'bo@mill.example' };
  expect(invitePersonSchema.safeParse(person).error?.issues[0]?.path).toEqual(['providerRoles']);
  expect(
    invitePersonSchema.parse({ ...person, laboratoryId: '', providerRoles: ['reviewer'] }),
  ).toMatchObject({
    laboratoryId: null,
    providerRoles: ['reviewer'],
  });
  expect(invitePersonSchema.parse({ ...person, laboratoryId: '7' })).toMatchObject({ laboratoryId: 7 });
  expect(invitePersonSchema.safeParse({ ...person, providerRoles: ['lab_manager'] }).success).toBe(false);
});

it('wants the same password twice', () => {
  const input = { ...owner, password: 'grain dust and rivers', passwordAgain: 'grain dust and river' };
  expect(setUpSchema.safeParse(input).error?.issues[0]?.path).toEqual(['passwordAgain']);
});

it('keeps the last day of a token within two years', () => {
  const today = new Date().toISOString().slice(0, 10);
  const last = lastTokenDay(new Date());
  const parse = (expiresOn: string) => newTokenSchema.safeParse({ name: 'LIMS', expiresOn }).success;
  expect(parse(today)).toBe(true);
  expect(parse(last)).toBe(true);
  expect(parse('2001-01-01')).toBe(false);
  expect(parse(`${Number(last.slice(0, 4)) + 1}-01-01`)).toBe(false);
  for (const wrong of ['', 'tomorrow', '2027-02-30', '31.12.2027']) expect(parse(wrong)).toBe(false);
});

it('gives the last day within two years also from a leap day', () => {
  expect(lastTokenDay(new Date('2028-02-29T10:00:00Z'))).toBe('2030-03-01');
});

it('reads an empty contact e-mail as none', () => {
  expect(newLaboratorySchema.parse({ name: 'Mill', kind: 'mill', contactEmail: '' })).toEqual({
    name: 'Mill',
    kind: 'mill',
    town: '',
    contactEmail: null,
  });
});
