import { useId, type JSX } from 'react';

import type { ReportPicture } from '#common/schemas/report';

const side = 320;

/** The lattice as a drawing that prints. */
export function ReportDrawing({ picture }: { picture: ReportPicture }): JSX.Element {
  const id = useId();
  const colours = [...new Set(picture.balls.map(({ colour }) => colour))];
  return (
    <figure className="mx-auto w-full max-w-72 md:mx-0 md:ml-auto">
      <svg viewBox={`0 0 ${side} ${side}`} role="img" aria-label={picture.description}>
        <defs>
          {colours.map((colour, k) => (
            <radialGradient key={colour} id={`${id}-${k}`} cx="34%" cy="30%" r="75%">
              <stop offset="0%" stopColor="#fff" stopOpacity="0.6" />
              <stop offset="45%" stopColor={colour} stopOpacity="0" />
              <stop offset="100%" stopColor="#000" stopOpacity="0.35" />
            </radialGradient>
          ))}
        </defs>
        <g className="stroke-soft" strokeWidth="1">
          {picture.edges.map(({ x1, y1, x2, y2 }, index) => (
            <line key={index} x1={x1 * side} y1={y1 * side} x2={x2 * side} y2={y2 * side} />
          ))}
        </g>
        {picture.balls.map(({ x, y, radius, colour }, index) => (
          <g key={index}>
            <circle cx={x * side} cy={y * side} r={radius * side} fill={colour} />
            <circle
              cx={x * side}
              cy={y * side}
              r={radius * side}
              fill={`url(#${id}-${colours.indexOf(colour)})`}
            />
          </g>
        ))}
      </svg>
      <figcaption className="flex flex-wrap justify-center gap-x-4 text-small text-soft">
        {picture.legend.map(({ ion, colour }) => (
          <span key={ion} className="inline-flex items-center gap-1.5">
            <svg aria-hidden viewBox="0 0 10 10" className="size-2.5">
              <circle cx="5" cy="5" r="5" fill={colour} />
            </svg>
            {ion}
          </span>
        ))}
      </figcaption>
    </figure>
  );
}
