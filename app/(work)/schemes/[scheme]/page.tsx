import { MeasurandDialog } from '@/components/forms/measurand-dialog';
import { SchemeDialog } from '@/components/forms/scheme-dialog';
import { RoundTable } from '@/components/rounds/round-table';
import { ButtonLink } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHeader } from '@/components/ui/page-header';
import { db } from '@/db/connection';
import { listRounds } from '@/db/views/round-list-view';
import { requirePageActor } from '@/lib/auth/guards';
import { can } from '@/lib/rules/permissions';
import { addMeasurandAction, changeMeasurandAction, changeSchemeAction } from '../actions';
import { findOr404 } from '../../rounds/find-or-404';
import { getSchemeWithMeasurands } from '@/lib/services/schemes';
import { MeasurandTable } from './measurand-table';
import { NEW_MEASURAND, toFormValues } from './measurand-values';

export default async function SchemePage({ params }: PageProps<'/schemes/[scheme]'>) {
  const actor = await requirePageActor('scheme:view');
  const { scheme: slug } = await params;
  const { scheme, measurands } = await findOr404(getSchemeWithMeasurands(slug));
  const rounds = await listRounds(db(), { schemeId: scheme.id });
  const mayEdit = can(actor, 'scheme:edit');
  const add = mayEdit && <MeasurandDialog action={addMeasurandAction} scheme={slug} values={NEW_MEASURAND} />;
  const newRound = can(actor, 'round:edit') && measurands.length > 0 && (
    <ButtonLink href={`/rounds/new?scheme=${slug}`} variant="primary">
      New round
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title={scheme.name}
        lead={scheme.description}
        breadcrumb={[{ href: '/schemes', label: 'Schemes' }]}
        actions={mayEdit && <SchemeDialog action={changeSchemeAction} scheme={scheme} />}
      />
      <section className="flex flex-col gap-3" aria-labelledby="measurands">
        <div className="flex flex-wrap items-end justify-between gap-3">
          <h2 id="measurands">Measurands</h2>
          {measurands.length > 0 && add}
        </div>
        {measurands.length === 0 ? (
          <EmptyState title="No measurand yet" action={add}>
            Measurands stand here with their units, limits and the rule for sigma_pt. Add the first one; then
            a round can be planned.
          </EmptyState>
        ) : (
          <MeasurandTable
            measurands={measurands}
            edit={
              mayEdit
                ? (measurand) => (
                    <MeasurandDialog
                      action={changeMeasurandAction}
                      scheme={slug}
                      values={toFormValues(measurand)}
                    />
                  )
                : undefined
            }
          />
        )}
      </section>
      <section className="flex flex-col gap-3" aria-labelledby="rounds">
        <div className="flex flex-wrap items-end justify-between gap-3">
          <h2 id="rounds">Rounds</h2>
          {rounds.length > 0 && newRound}
        </div>
        {rounds.length === 0 ? (
          <EmptyState title="No round yet" action={newRound}>
            {measurands.length === 0
              ? 'A round measures the measurands above; add one first.'
              : 'Rounds of this scheme stand here.'}
          </EmptyState>
        ) : (
          <RoundTable caption={`Rounds of ${scheme.name}`} rounds={rounds} hideScheme />
        )}
      </section>
    </>
  );
}
