import { AddMeasurandForm } from '@/components/forms/add-measurand-form';
import { ItemDialog } from '@/components/forms/item-dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { requirePageActor } from '@/lib/auth/guards';
import { can } from '@/lib/rules/permissions';
import { roundStateWords } from '@/lib/rules/round-states';
import { getRoundPlan } from '@/lib/services/round-plan';
import { findOr404 } from '../../find-or-404';
import { loadRound } from '../load-round';
import { addItemAction, addMeasurandAction } from './actions';
import { ItemPlan } from './item-plan';
import { RoundDates } from './round-dates';

export const metadata = { title: 'Plan' };

export default async function PlanPage({ params }: PageProps<'/rounds/[round]/plan'>) {
  const actor = await requirePageActor('round:view');
  const { round: slug } = await params;
  const { round } = await loadRound(slug);
  const { items, measurands, choices } = await findOr404(getRoundPlan(slug));
  const mayEdit = can(actor, 'round:edit');
  const isDraft = mayEdit && round.state === 'draft';
  const addItem = isDraft && <ItemDialog action={addItemAction} round={slug} measurands={choices} />;
  return (
    <>
      <RoundDates round={round} mayEdit={mayEdit} />
      <section className="flex flex-col gap-5" aria-labelledby="items">
        <div className="flex flex-wrap items-end justify-between gap-3">
          <h2 id="items">Test items and measurands</h2>
          {items.length > 0 && addItem}
        </div>
        {mayEdit && !isDraft && (
          <Notice>
            The round is {roundStateWords(round.state)}, so items, measurands and the way they are evaluated
            are fixed. Participants have measured what the plan asked for.
          </Notice>
        )}
        {items.length === 0 && (
          <EmptyState title="No test item yet" action={addItem}>
            Each test item stands here with its measurands and how they are evaluated. Laboratories use its
            code in their results files.
          </EmptyState>
        )}
        {items.map((item) => {
          const own = measurands.filter((entry) => entry.testItemId === item.id);
          const missing = choices.filter((choice) => !own.some((entry) => entry.measurandId === choice.id));
          return (
            <ItemPlan key={item.id} round={slug} item={item} measurands={own} isDraft={isDraft}>
              {isDraft && missing.length > 0 && (
                <AddMeasurandForm
                  action={addMeasurandAction}
                  round={slug}
                  item={{ id: item.id, code: item.code }}
                  measurands={missing}
                />
              )}
            </ItemPlan>
          );
        })}
      </section>
    </>
  );
}
