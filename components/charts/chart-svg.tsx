import { useId, type ReactNode } from 'react';
import { cx } from '@/components/ui/cx';
import { NARROW, WIDE, type ChartSize } from './chart-size';

export type ChartSvgProps = {
  size: ChartSize;
  name: string;
  description: string;
  /** True when single marks are not offered to keyboard and screen reader. */
  asWhole: boolean;
  className?: string;
  children: ReactNode;
};

/** The drawing itself. Its name is an attribute, since browsers show a title element as a tooltip. */
export function ChartSvg({ size, name, description, asWhole, className, children }: ChartSvgProps) {
  const id = useId();
  return (
    <svg
      data-chart=""
      viewBox={`0 0 ${size.width} ${size.height}`}
      role={asWhole ? 'img' : 'group'}
      aria-label={name}
      aria-describedby={id}
      className={cx('chart h-auto w-full max-w-5xl text-[13px]', className)}
    >
      <desc id={id}>{description}</desc>
      {children}
    </svg>
  );
}

type TwoSizesProps = Omit<ChartSvgProps, 'size' | 'className' | 'children'> & {
  draw: (size: ChartSize) => ReactNode;
};

/** The same drawing for wide and for narrow screens; one of the two is shown, the other is hidden from all. */
export function ChartInTwoSizes({ draw, ...rest }: TwoSizesProps) {
  return (
    <>
      <ChartSvg {...rest} size={WIDE} className="hidden md:block print:block">
        {draw(WIDE)}
      </ChartSvg>
      <ChartSvg {...rest} size={NARROW} className="md:hidden print:hidden">
        {draw(NARROW)}
      </ChartSvg>
    </>
  );
}
