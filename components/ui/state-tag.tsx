import type { RoundState } from '@/lib/rules/round-states';
import { cx } from './cx';

export type RoundStateName = RoundState | 'reissued';
export type EnrolmentStateName = 'invited' | 'enrolled' | 'declined' | 'withdrawn';
export type SubmissionStateName = 'none' | 'draft' | 'submitted' | 'superseded';
export type StateTagProps =
  | { of: 'round'; state: RoundStateName }
  | { of: 'enrolment'; state: EnrolmentStateName }
  | { of: 'submission'; state: SubmissionStateName };

type Look = { words: string; filled: 0 | 1 | 2 | 3 | 4 | 'void' };

const LOOKS: { [Of in StateTagProps['of']]: Record<Extract<StateTagProps, { of: Of }>['state'], Look> } = {
  round: {
    draft: { words: 'being planned', filled: 0 },
    open: { words: 'open for results', filled: 1 },
    closed: { words: 'closed, under review', filled: 2 },
    evaluated: { words: 'waiting for sign-off', filled: 3 },
    published: { words: 'published', filled: 4 },
    reissued: { words: 'reissued', filled: 4 },
    cancelled: { words: 'cancelled', filled: 'void' },
  },
  enrolment: {
    invited: { words: 'invited', filled: 0 },
    enrolled: { words: 'enrolled', filled: 4 },
    declined: { words: 'declined', filled: 'void' },
    withdrawn: { words: 'withdrawn', filled: 'void' },
  },
  submission: {
    none: { words: 'nothing yet', filled: 0 },
    draft: { words: 'draft, not submitted', filled: 2 },
    submitted: { words: 'submitted', filled: 4 },
    superseded: { words: 'replaced by a later one', filled: 'void' },
  },
};

function lookOf(tag: StateTagProps): Look {
  if (tag.of === 'round') return LOOKS.round[tag.state];
  if (tag.of === 'enrolment') return LOOKS.enrolment[tag.state];
  return LOOKS.submission[tag.state];
}

/** A state in plain words, with a dial that fills as the matter moves on. */
export function StateTag(tag: StateTagProps) {
  const { words, filled } = lookOf(tag);
  return (
    <span
      className={cx('inline-flex items-baseline gap-1.5 whitespace-nowrap', filled === 'void' && 'text-grey')}
    >
      <Dial filled={filled} />
      {words}
    </span>
  );
}

const QUARTERS = [
  '',
  'M6 6V1a5 5 0 0 1 5 5Z',
  'M6 1a5 5 0 0 1 0 10Z',
  'M6 6V1a5 5 0 1 1-5 5Z',
  'M6 1a5 5 0 0 1 0 10a5 5 0 0 1 0-10Z',
];

function Dial({ filled }: Pick<Look, 'filled'>) {
  return (
    <svg
      viewBox="0 0 12 12"
      aria-hidden="true"
      className="inline-block size-[0.8em] shrink-0 translate-y-[0.04em]"
    >
      <circle cx="6" cy="6" r="5" fill="none" stroke="currentColor" strokeWidth="1.3" />
      {filled === 'void' ? (
        <path d="m2.5 9.5 7-7" stroke="currentColor" strokeWidth="1.3" />
      ) : (
        <path d={QUARTERS[filled]} fill="currentColor" />
      )}
    </svg>
  );
}
