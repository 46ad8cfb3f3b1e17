'use client';

import { useRouter } from 'next/navigation';
import { UploadFile, type UploadTexts } from '@/components/upload/upload-file';

export type ResultsUploadProps = {
  /** The round's slug; the receipt's page lies below it. */
  round: string;
  laboratoryId: number;
  isAmendment: boolean;
};

const HINT =
  'A CSV file with the columns item, measurand and result, and any of replicate, unit, expanded_uncertainty, ' +
  'coverage_factor, loq, method, analysed_on and comment. It is checked first; you see how each row was read ' +
  'before anything is submitted.';

/** The upload of one laboratory's results, which leads to the receipt. */
export function ResultsUpload({ round, laboratoryId, isAmendment }: ResultsUploadProps) {
  const router = useRouter();
  const texts: UploadTexts = {
    drop: isAmendment ? 'Drop an amended file here' : 'Drop the results file here',
    hint: HINT,
    submit: isAmendment ? 'Submit these results instead' : 'Submit these results',
    taken: 'The results were received. The receipt is being opened.',
  };
  return (
    <UploadFile
      // The laboratory goes with the file: another one may be chosen in another window meanwhile.
      address={`/api/rounds/${encodeURIComponent(round)}/results?laboratory=${laboratoryId}`}
      kind="laboratory"
      texts={texts}
      onTaken={({ receipt, repeat }) =>
        router.push(`/laboratory/rounds/${round}/receipts/${receipt}${repeat ? '?again=1' : ''}`)
      }
    />
  );
}
