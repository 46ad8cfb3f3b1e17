import type { ReactNode } from 'react';
import { ItemDialog } from '@/components/forms/item-dialog';
import { MeasurandPlanDialog } from '@/components/forms/measurand-plan-dialog';
import type { MeasurandPlanValues } from '@/components/forms/measurand-plan-form';
import { assignedWords, scoreWords, sigmaWords } from '@/components/rounds/plan-words';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Table, Td, Th } from '@/components/ui/table';
import type { PlannedItem, PlannedMeasurand } from '@/lib/services/round-plan';
import { changeItemAction, changeMeasurandAction, dropItemAction, dropMeasurandAction } from './actions';

type ItemPlanProps = {
  round: string;
  item: PlannedItem;
  measurands: PlannedMeasurand[];
  isDraft: boolean;
  children?: ReactNode;
};

export function ItemPlan({ round, item, measurands, isDraft, children }: ItemPlanProps) {
  return (
    <section className="flex flex-col gap-2" aria-label={`Item ${item.code}`}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h3>
          {item.code} <span className="font-normal">{item.name}</span>
        </h3>
        {isDraft && (
          <div className="flex flex-wrap gap-1">
            <ItemDialog action={changeItemAction} round={round} item={item} />
            <ConfirmDialog
              triggerLabel={`Remove item ${item.code}`}
              triggerVariant="quiet"
              triggerSize="small"
              title={`Remove item ${item.code}`}
              confirmLabel="Remove it"
              danger
              fields={{ round, item: String(item.id) }}
              action={dropItemAction.bind(null, null)}
            >
              The item and the plan of its measurands are removed.
            </ConfirmDialog>
          </div>
        )}
      </div>
      {measurands.length === 0 ? (
        <p className="text-ink-soft">No measurand yet.</p>
      ) : (
        <Table caption={`Measurands of item ${item.code}`} hideCaption fullHeight stacked>
          <thead>
            <tr>
              <Th>Measurand</Th>
              <Th>Unit</Th>
              <Th numeric>Replicates</Th>
              <Th>Assigned value</Th>
              <Th>sigma_pt</Th>
              <Th>Score</Th>
              {isDraft && (
                <Th>
                  <span className="sr-only">Change</span>
                </Th>
              )}
            </tr>
          </thead>
          <tbody>
            {measurands.map((entry) => (
              <MeasurandRow key={entry.id} round={round} entry={entry} isDraft={isDraft} />
            ))}
          </tbody>
        </Table>
      )}
      {children}
    </section>
  );
}

function MeasurandRow({
  round,
  entry,
  isDraft,
}: {
  round: string;
  entry: PlannedMeasurand;
  isDraft: boolean;
}) {
  const name = `${entry.itemCode} ${entry.code}`;
  return (
    <tr>
      <Th scope="row">
        <span className="font-semibold">{entry.code}</span> {entry.name}
      </Th>
      <Td label="Unit">{entry.unit}</Td>
      <Td label="Replicates" numeric>
        {entry.replicates}
      </Td>
      <Td label="Assigned value" className="min-w-40">
        {assignedWords(entry, entry.unit)}
        {entry.statedSource && <span className="block text-sm text-ink-soft">{entry.statedSource}</span>}
      </Td>
      <Td label="sigma_pt" className="min-w-40">
        {sigmaWords(entry, entry.unit)}
      </Td>
      <Td label="Score" className="min-w-40">
        {scoreWords(entry)}
      </Td>
      {isDraft && (
        <Td className="text-right whitespace-nowrap">
          <MeasurandPlanDialog
            action={changeMeasurandAction}
            round={round}
            measurand={{ id: entry.id, name, unit: entry.unit }}
            values={planValues(entry)}
          />
          <ConfirmDialog
            triggerLabel={`Remove ${name}`}
            triggerVariant="quiet"
            triggerSize="small"
            title={`Remove ${name}`}
            confirmLabel="Remove it"
            danger
            fields={{ round, measurand: String(entry.id) }}
            action={dropMeasurandAction.bind(null, null)}
          >
            {entry.code} is no longer measured in item {entry.itemCode}.
          </ConfirmDialog>
        </Td>
      )}
    </tr>
  );
}

const text = (value: number | string | null): string => (value === null ? '' : String(value));

function planValues(entry: PlannedMeasurand): MeasurandPlanValues {
  return {
    replicates: String(entry.replicates),
    assignedMethod: entry.assignedMethod,
    statedValue: text(entry.statedValue),
    statedUncertainty: text(entry.statedUncertainty),
    statedSource: text(entry.statedSource),
    sigmaRule: entry.sigmaRule,
    sigmaValue: text(entry.sigmaValue),
    sigmaPercent: text(entry.sigmaPercent),
    scoreKind: entry.scoreKind,
    zPrimeWhenNeeded: entry.zPrimeWhenNeeded,
  };
}
