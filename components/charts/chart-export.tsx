'use client';

import { useState, type MouseEvent } from 'react';
import { Button } from '@/components/ui/button';
import { chartToSvg, saveFile, svgToPng } from './export-chart';

export type ChartExportProps = { fileName: string; note: string };

/** Saves the drawing of the figure it stands in, in the size that is on the screen. */
export function ChartExport({ fileName, note }: ChartExportProps) {
  const [failed, setFailed] = useState(false);

  async function save(event: MouseEvent<HTMLButtonElement>, kind: 'svg' | 'png') {
    const drawings =
      event.currentTarget.closest('figure')?.querySelectorAll<SVGSVGElement>('svg[data-chart]') ?? [];
    const drawing = [...drawings].find((svg) => svg.getClientRects().length > 0);
    if (!drawing) return;
    setFailed(false);
    const source = chartToSvg(drawing, note);
    try {
      const file = kind === 'svg' ? new Blob([source], { type: 'image/svg+xml' }) : await svgToPng(source);
      saveFile(file, `${fileName}.${kind}`);
    } catch (error) {
      setFailed(true);
      reportError(error);
    }
  }

  return (
    <span className="no-print inline-flex flex-wrap items-center gap-x-1">
      <Button variant="quiet" size="small" onClick={(event) => save(event, 'svg')}>
        Save as SVG
      </Button>
      <Button variant="quiet" size="small" onClick={(event) => save(event, 'png')}>
        Save as PNG
      </Button>
      <span aria-live="polite" className="text-sm text-action">
        {failed && 'The picture was not made. Save it as SVG.'}
      </span>
    </span>
  );
}
