import type { MeasurandValues } from '@/components/forms/measurand-form';
import type { Measurand } from '@/lib/services/schemes';

export const NEW_MEASURAND: MeasurandValues = {
  code: '',
  name: '',
  unit: 'ug/kg',
  decimals: '1',
  decisionLimit: '',
  decisionLimitSource: '',
  sigmaRule: 'percent',
  sigmaValue: '',
  sigmaPercent: '',
};

const text = (value: number | string | null): string => (value === null ? '' : String(value));

export function toFormValues(measurand: Measurand): MeasurandValues {
  return {
    id: measurand.id,
    code: measurand.code,
    name: measurand.name,
    unit: measurand.unit,
    decimals: String(measurand.decimals),
    decisionLimit: text(measurand.decisionLimit),
    decisionLimitSource: text(measurand.decisionLimitSource),
    sigmaRule: measurand.sigmaRule,
    sigmaValue: text(measurand.sigmaValue),
    sigmaPercent: text(measurand.sigmaPercent),
  };
}
