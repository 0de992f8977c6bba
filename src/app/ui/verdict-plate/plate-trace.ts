import { markPath } from '../marks/mark-path';

/** What the outline of a plate carries. */
export type PlateVariant = 'accepted' | 'rejected' | 'on-hold' | 'concession' | 'continue' | 'stop';

/** One stroke of the trace; `dotted` is still to come. */
export interface TraceStroke {
  readonly d: string;
  readonly dotted?: boolean;
}

const HEIGHT = 24;
const MIDDLE = HEIGHT / 2;

/** The line under the verdict's word, `width` x 24 px: settling, broken by a spike, interrupted, or still running. */
export function plateTrace(variant: PlateVariant, width: number): TraceStroke[] {
  switch (variant) {
    case 'accepted':
      return [{ d: markPath({ x: 0, y: MIDDLE, width: width * 0.36, amplitude: 10, tail: width * 0.64 }) }];
    case 'rejected':
    case 'stop':
      return [{ d: spike(width) }, { d: bars(width - HEIGHT * 0.8, width - HEIGHT * 0.55, 0.4) }];
    case 'on-hold':
    case 'concession':
      return [
        { d: `M0 ${MIDDLE}H${width * 0.42}M${width * 0.58} ${MIDDLE}H${width}` },
        { d: bars(width * 0.46, width * 0.54, 0.36) },
      ];
    default:
      return [{ d: ripple(width / 2) }, { d: `M${width / 2} ${MIDDLE}H${width}`, dotted: true }];
  }
}

function spike(width: number): string {
  const [up, down] = [HEIGHT * 0.46, HEIGHT * 0.92];
  const [step, drop] = [HEIGHT * 0.18, HEIGHT * 0.3];
  return `M0 ${MIDDLE}H${width * 0.62}l${step} ${-up}l${drop} ${down}l${step} ${-up}`;
}

function bars(first: number, second: number, half: number): string {
  const [top, length] = [MIDDLE - HEIGHT * half, 2 * HEIGHT * half];
  return `M${first} ${top}v${length}M${second} ${top}v${length}`;
}

function ripple(width: number): string {
  const points = Array.from({ length: Math.floor(width / 2) + 1 }, (_, step) => {
    const x = step * 2;
    return `${x},${(MIDDLE - HEIGHT * 0.34 * Math.sin(x / 11)).toFixed(2)}`;
  });
  return `M${points.join(' ')}`;
}
