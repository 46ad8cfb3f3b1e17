'use client';

import { useRouter } from 'next/navigation';
import { UploadFile } from '@/components/upload/upload-file';
import { formatCount } from '@/lib/format';

/** Loads a whole round from one file: one row a laboratory and result. */
export function WholeRoundUpload({ round }: { round: string }) {
  const router = useRouter();
  return (
    <UploadFile
      address={`/api/rounds/${round}/whole-round`}
      kind="whole-round"
      texts={{
        drop: 'Drop the file of the whole round here',
        hint: 'One row for each laboratory and result: the columns of a results file and the column laboratory.',
        submit: 'Load the whole round',
        taken: 'Loaded. The results are on their way to the page.',
      }}
      about={(report) =>
        report.newLaboratories.length > 0 && (
          <p>
            {formatCount(
              report.newLaboratories.length,
              'laboratory is new and is',
              'laboratories are new and are',
            )}{' '}
            made: {report.newLaboratories.join(', ')}.
          </p>
        )
      }
      onTaken={() => {
        router.push(`/rounds/${round}/results`);
        router.refresh();
      }}
    />
  );
}
