import type { ReactNode } from 'react';

/** One third, set as a fraction by the font's own figures. */
export function Third(): ReactNode {
  return <span className="fraction">1/3</span>;
}
