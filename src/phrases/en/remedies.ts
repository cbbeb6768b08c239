import type { Figure, RemedyKind } from '../../calc/index.ts';
import type { Show } from '../show.ts';

/** The smallest change that would pass, as a button says it. */
export const remedyLabel = (kind: RemedyKind, number: Figure | null, show: Show): string => {
  const value = number?.value ?? 0;
  switch (kind) {
    case 'stickout':
      return `Stick out ${show.length(value, 'down')} or less`;
    case 'tailstock':
      return 'Bring up the tailstock';
    case 'moreTurns':
      return `Take ${show.count(value)} turns`;
    case 'slower':
      return `Run at ${show.speed(value)}`;
    case 'narrowerWheel':
      return `Wheel with a face of ${show.length(value, 'down')}`;
    case 'plug':
      return 'Plug the bore';
    case 'opposed':
      return 'Opposed wheels';
    case 'cut':
      return 'Cut it instead';
  }
};
