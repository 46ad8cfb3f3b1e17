import { formatPlainNumber, showMinus } from '@/lib/format';
import type { WorkingInput, WorkingIteration, WorkingStep } from '@/lib/stats/working';

/** Figures in a working are given in full, so that the sum can be redone by hand. */
export function workingText(value: WorkingInput): string {
  if (value === null) return 'none';
  if (typeof value === 'string') return value;
  if (typeof value === 'number') return String(value);
  return value.map(String).join(', ');
}

/** The whole working as plain text for the clipboard. */
export function workingAsText(steps: readonly WorkingStep[], version?: string): string {
  const parts = steps.map((step) => {
    const inputs = Object.entries(step.inputs).map(([name, value]) => `  ${name} = ${workingText(value)}`);
    return [
      `${step.name} (${step.clause})`,
      `  ${step.formula}`,
      ...inputs,
      ...iterationLines(step.iterations ?? []),
      `  result: ${workingText(step.value)}`,
    ].join('\n');
  });
  return [...parts, ...(version ? [`Statistics library version ${version}`] : [])].join('\n\n');
}

function iterationLines(rows: readonly WorkingIteration[]): string[] {
  const keys = Object.keys(rows[0] ?? {});
  if (keys.length === 0) return [];
  return [keys, ...rows.map((row) => keys.map((key) => String(row[key])))].map(
    (cells) => `  ${cells.join('\t')}`,
  );
}

export type WorkingStepsProps = { steps: readonly WorkingStep[]; version?: string };

export function WorkingSteps({ steps, version }: WorkingStepsProps) {
  return (
    <div>
      <ol className="flex flex-col gap-5">
        {steps.map((step, index) => (
          <Step key={index} step={step} />
        ))}
      </ol>
      {version && <p className="mt-4 text-sm text-ink-soft">Statistics library version {version}</p>}
    </div>
  );
}

function Step({ step }: { step: WorkingStep }) {
  const inputs = Object.entries(step.inputs);
  return (
    <li className="border-t pt-3">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <p className="font-serif font-semibold">{step.name}</p>
        <span className="text-sm text-ink-soft">{step.clause}</span>
      </div>
      <p className="symbol mt-1 wrap-anywhere">{step.formula}</p>
      {inputs.length > 0 && (
        <dl className="mt-2 grid grid-cols-[minmax(5rem,auto)_1fr] gap-x-4 gap-y-0.5 text-sm">
          {inputs.map(([name, value]) => (
            <div key={name} className="contents">
              <dt className="symbol">{name}</dt>
              <dd className="tabular-nums wrap-anywhere">{showMinus(workingText(value))}</dd>
            </div>
          ))}
        </dl>
      )}
      {step.iterations && step.iterations.length > 0 && <Iterations rows={step.iterations} />}
      <p className="mt-2 font-semibold tabular-nums">
        <span className="font-normal text-ink-soft">Result </span>
        {showMinus(workingText(step.value))}
      </p>
    </li>
  );
}

function Iterations({ rows }: { rows: readonly WorkingIteration[] }) {
  const keys = Object.keys(rows[0] ?? {});
  return (
    <div role="region" aria-label="Iterations" tabIndex={0} className="mt-2 overflow-x-auto">
      <table className="border-collapse text-sm">
        <thead>
          <tr>
            {keys.map((key) => (
              <th
                key={key}
                scope="col"
                className="symbol border-b px-3 py-1 text-right font-normal first:pl-0"
              >
                {key}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <tr key={index}>
              {keys.map((key) => (
                <td key={key} className="figures border-b px-3 py-1 text-right first:pl-0">
                  {showMinus(iterationFigure(row[key]))}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

const ITERATION_DECIMALS = 8;

function iterationFigure(value: number | undefined): string {
  if (value === undefined) return '';
  return Number.isInteger(value) ? String(value) : formatPlainNumber(value, ITERATION_DECIMALS);
}
