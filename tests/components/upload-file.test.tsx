// @vitest-environment jsdom
import { act, cleanup, fireEvent, render, screen } from '@testing-library/react';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { UploadFile } from '@/components/upload/upload-file';

/** Stands where the browser's own request would be; a test answers it. */
class FakeRequest {
  static all: FakeRequest[] = [];
  onload: (() => void) | null = null;
  onerror: (() => void) | null = null;
  onabort: (() => void) | null = null;
  upload: { onprogress: ((event: { loaded: number; total: number }) => void) | null } = { onprogress: null };
  status = 0;
  responseText = '';
  address = '';
  body: Blob | null = null;

  constructor() {
    FakeRequest.all.push(this);
  }
  open(_method: string, address: string) {
    this.address = address;
  }
  setRequestHeader() {}
  send(body: Blob) {
    this.body = body;
  }
  abort() {
    this.onabort?.();
  }
  async answer(status: number, body: object) {
    this.status = status;
    this.responseText = JSON.stringify(body);
    await act(async () => this.onload?.());
  }
  async fail() {
    await act(async () => this.onerror?.());
  }
}

const TEXTS = {
  drop: 'Drop it here',
  hint: 'A CSV file.',
  submit: 'Submit these results',
  taken: 'Received.',
};
const GOOD = {
  ok: true,
  encoding: 'UTF-8',
  separator: ',',
  decimalMark: null,
  rowCount: 1,
  ignoredColumns: [],
  problems: [],
  unlistedProblems: 0,
  notices: [],
  unlistedNotices: 0,
  newLaboratories: [],
  results: [],
};
const CSV = 'item,measurand,result\nM1,AFT,=1\n';

beforeEach(() => {
  FakeRequest.all = [];
  vi.stubGlobal('XMLHttpRequest', FakeRequest);
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function lastRequest(): FakeRequest {
  const request = FakeRequest.all.at(-1);
  if (!request) throw new Error('nothing was sent');
  return request;
}

async function choose(onTaken: (answer: Record<string, unknown>) => void = () => {}, text = CSV) {
  render(
    <UploadFile address="/api/results?laboratory=3" kind="laboratory" texts={TEXTS} onTaken={onTaken} />,
  );
  const file = new File([text], 'my results.csv');
  await act(async () => {
    fireEvent.change(screen.getByLabelText('Choose a file'), { target: { files: [file] } });
  });
  await vi.waitFor(() => expect(FakeRequest.all).toHaveLength(1));
}

it('checks first, then submits the same bytes once, however often the button is pressed', async () => {
  const onTaken = vi.fn();
  await choose(onTaken);
  expect(lastRequest().address).toBe('/api/results?laboratory=3&check=1&name=my+results.csv');
  await lastRequest().answer(200, GOOD);
  const submit = screen.getByRole('button', { name: 'Submit these results' });
  await act(async () => {
    submit.click();
    submit.click();
  });
  expect(FakeRequest.all).toHaveLength(2);
  expect(lastRequest().address).toBe('/api/results?laboratory=3&name=my+results.csv');
  expect(lastRequest().body).toBe(FakeRequest.all[0]?.body);
  await lastRequest().answer(201, { receipt: 'X' });
  expect(onTaken).toHaveBeenCalledExactlyOnceWith({ receipt: 'X' });
  expect(screen.getByRole('status').textContent).toBe('Received.');
});

it('shows how much has been sent, and that the server is at it once all is sent', async () => {
  await choose();
  act(() => lastRequest().upload.onprogress?.({ loaded: 50, total: 200 }));
  expect(screen.getByRole('progressbar', { name: 'Sent' }).getAttribute('value')).toBe('25');
  act(() => lastRequest().upload.onprogress?.({ loaded: 200, total: 200 }));
  expect(screen.getByRole('status').textContent).toBe('The file is being checked');
});

it('shows each problem at its cell and offers no way to submit', async () => {
  await choose();
  await lastRequest().answer(422, {
    ...GOOD,
    ok: false,
    problems: [
      {
        code: 'formula',
        line: 2,
        column: 'result',
        found: '=1',
        expected: 'Write the value that it gives.',
        message: 'Line 2, result: found a formula, "=1". Write the value that it gives.',
      },
    ],
  });
  await vi.waitFor(() => expect(screen.getByText(/^Line 2, result: found a formula/)).toBeTruthy());
  const cell = await screen.findByRole('cell', { name: /^=1\s*Found "=1"/ });
  expect(cell).toBeTruthy();
  expect(screen.queryByRole('button', { name: 'Submit these results' })).toBeNull();
});

it('keeps the file when the connection is lost, and when the sign-in has ended', async () => {
  const onTaken = vi.fn();
  await choose(onTaken);
  await lastRequest().fail();
  expect(screen.getByRole('alert').textContent).toContain('my results.csv is kept here');
  fireEvent.click(screen.getByRole('button', { name: 'Check again' }));
  await lastRequest().answer(200, GOOD);
  fireEvent.click(screen.getByRole('button', { name: 'Submit these results' }));
  await lastRequest().answer(401, { detail: 'Sign in first.' });
  expect(screen.getByRole('alert').textContent).toContain('Your sign-in has ended');
  fireEvent.click(screen.getByRole('button', { name: 'Send again' }));
  await lastRequest().answer(200, { receipt: 'X', repeat: true });
  expect(onTaken).toHaveBeenCalledExactlyOnceWith({ receipt: 'X', repeat: true });
});

it('says what the server says when the round has closed meanwhile', async () => {
  await choose();
  await lastRequest().answer(200, GOOD);
  fireEvent.click(screen.getByRole('button', { name: 'Submit these results' }));
  await lastRequest().answer(409, { detail: 'Maize 1 takes no results: it is closed.' });
  expect(screen.getByRole('alert').textContent).toContain('Maize 1 takes no results');
});

it('can be stopped', async () => {
  await choose();
  await act(async () => screen.getByRole('button', { name: 'Stop' }).click());
  expect(screen.getByText('Sending was stopped.')).toBeTruthy();
});

it('asks for one file at a time', async () => {
  render(<UploadFile address="/api/x" kind="laboratory" texts={TEXTS} onTaken={() => {}} />);
  const zone = screen.getByText('Drop it here').parentElement;
  if (!zone) throw new Error('there is no drop zone');
  await act(async () => {
    fireEvent.drop(zone, { dataTransfer: { files: [new File(['a'], 'a.csv'), new File(['b'], 'b.csv')] } });
  });
  expect(screen.getByText('Found 2 files. Choose one file.')).toBeTruthy();
  expect(FakeRequest.all).toHaveLength(0);
});

it('takes a file that was chosen before the page listened', async () => {
  const element = <UploadFile address="/api/x" kind="laboratory" texts={TEXTS} onTaken={() => {}} />;
  const container = document.createElement('div');
  document.body.append(container);
  container.innerHTML = renderToString(element);
  const field = container.querySelector('input');
  if (!field) throw new Error('there is no file field');
  Object.defineProperty(field, 'files', { value: [new File([CSV], 'early.csv')] });
  await act(async () => void render(element, { container, hydrate: true }));
  await vi.waitFor(() => expect(lastRequest().address).toContain('name=early.csv'));
});
