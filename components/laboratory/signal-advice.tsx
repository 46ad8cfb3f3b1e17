import { FilledSquare, OpenTriangle } from '@/components/ui/shapes';

export type SignalAdviceProps = {
  signal: 'warning' | 'action';
  /** Level of the title among the headings of the page. */
  level?: 2 | 3;
};

const CHECKS = [
  'The unit and the number of decimals in the file, against the unit of the plan.',
  'Each dilution and aliquot: a step left out shifts a result by exactly its factor.',
  'The order of the items, on the bench and in the file: two may have been swapped.',
  'The calibration, its date, its blank and a control material from the same day.',
  'Reagents past their time, a column run too fast, a recovery applied twice or not at all.',
];

/** What a signal asks for: a look at the usual causes, by the laboratory's own procedure. */
export function SignalAdvice({ signal, level = 3 }: SignalAdviceProps) {
  const Heading = `h${level}` as const;
  const isAction = signal === 'action';
  const Shape = isAction ? FilledSquare : OpenTriangle;
  return (
    <section aria-label="What to do" className="max-w-measure border-y py-3">
      <Heading className="flex items-baseline gap-2 text-lg">
        <Shape />
        {isAction ? 'What to do about an action signal' : 'What to do about a warning signal'}
      </Heading>
      <p className="mt-1">
        {isAction
          ? 'Look for the cause now, and start a corrective action by your laboratory\u2019s own procedure.'
          : 'Look for a cause. A second warning in a row for the same measurand is treated like an action signal.'}
      </p>
      <ul className="mt-2 list-disc pl-5">
        {CHECKS.map((check) => (
          <li key={check}>{check}</li>
        ))}
      </ul>
      <p className="mt-2">
        Write down what was found, what was done, and how you saw that it helped. Results that went to
        customers on the same days may need a second look.
      </p>
    </section>
  );
}
