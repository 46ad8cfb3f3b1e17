import { Fragment, type ReactNode } from 'react';

const NAMES = /\b(x_pt|sigma_pt|E_n)\b/;

/** Text with the names of the field set as the charts set them: x and sigma with the index pt, E with n. */
export function Symbols({ children }: { children: string }) {
  const parts = children.split(NAMES);
  return parts.map((part, index) => <Fragment key={index}>{index % 2 === 1 ? SET[part] : part}</Fragment>);
}

const SET: Record<string, ReactNode> = {
  x_pt: (
    <span className="symbol">
      x<sub>pt</sub>
    </span>
  ),
  sigma_pt: (
    <span className="symbol">
      {'\u03c3'}
      <sub>pt</sub>
    </span>
  ),
  E_n: (
    <span className="symbol">
      E<sub>n</sub>
    </span>
  ),
};
