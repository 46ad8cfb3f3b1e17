import type { ReactNode } from 'react';
import { sigmaWords } from '@/components/rounds/plan-words';
import { Table, Td, Th } from '@/components/ui/table';
import type { Measurand } from '@/lib/services/schemes';

export function MeasurandTable({
  measurands,
  edit,
}: {
  measurands: Measurand[];
  edit?: (measurand: Measurand) => ReactNode;
}) {
  return (
    <Table caption="Measurands" hideCaption fullHeight stacked>
      <thead>
        <tr>
          <Th>Code</Th>
          <Th>Name</Th>
          <Th>Unit</Th>
          <Th numeric>Decimals</Th>
          <Th>Decision limit</Th>
          <Th>sigma_pt</Th>
          {edit && (
            <Th>
              <span className="sr-only">Edit</span>
            </Th>
          )}
        </tr>
      </thead>
      <tbody>
        {measurands.map((measurand) => (
          <tr key={measurand.id}>
            <Th scope="row" className="font-semibold">
              {measurand.code}
            </Th>
            <Td label="Name">{measurand.name}</Td>
            <Td label="Unit">{measurand.unit}</Td>
            <Td label="Decimals" numeric>
              {measurand.decimals}
            </Td>
            <Td label="Decision limit">
              {measurand.decisionLimit === null ? (
                <span className="text-grey">none</span>
              ) : (
                <>
                  {measurand.decisionLimit} {measurand.unit}
                  <span className="block text-sm text-ink-soft">
                    {measurand.decisionLimitSource ?? 'source not given'}
                  </span>
                </>
              )}
            </Td>
            <Td label="sigma_pt">{sigmaWords(measurand, measurand.unit)}</Td>
            {edit && <Td className="text-right whitespace-nowrap">{edit(measurand)}</Td>}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
