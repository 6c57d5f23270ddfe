import {
  symbol,
  symbolCircle,
  symbolCross,
  symbolDiamond,
  symbolSquare,
  symbolStar,
  symbolTriangle,
  symbolWye,
} from 'd3';
import type { ReactNode } from 'react';

/** Square pixels inside the outline. */
const areaPx2 = 46;

const shapes = [
  { type: symbolCircle, turn: 0 },
  { type: symbolSquare, turn: 0 },
  { type: symbolTriangle, turn: 0 },
  { type: symbolDiamond, turn: 0 },
  { type: symbolTriangle, turn: 180 },
  { type: symbolCross, turn: 45 },
  { type: symbolStar, turn: 0 },
  { type: symbolWye, turn: 0 },
].map(({ type, turn }) => ({ path: symbol(type, areaPx2)() ?? '', turn }));

/**
 * The open marker of a series, centred on the origin of the surrounding SVG. Shapes, not colours, tell series apart;
 * when the shapes are used up they return with a dot inside.
 */
export function Marker({ index }: { readonly index: number }): ReactNode {
  const shape = shapes[index % shapes.length];
  if (shape === undefined) return null;
  return (
    <>
      <path
        className="marker"
        d={shape.path}
        {...(shape.turn === 0 ? {} : { transform: `rotate(${shape.turn})` })}
      />
      {index >= shapes.length && <circle className="marker-dot" r="1.3" />}
    </>
  );
}

/** The marker as a small picture in running text. */
export function MarkerGlyph({ index }: { readonly index: number }): ReactNode {
  return (
    <svg
      width="14"
      height="14"
      viewBox="-7 -7 14 14"
      aria-hidden="true"
      className="mr-1.5 inline-block align-[-1px]"
    >
      <Marker index={index} />
    </svg>
  );
}
