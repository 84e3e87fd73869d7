import type { StylesheetJson } from 'cytoscape';

/** Colours of the theme that is on; a canvas can't read CSS variables by itself. */
export interface LineageColours {
  ink: string;
  muted: string;
  card: string;
  edge: string;
  ember: string;
  shell: string;
}

export function readColours(element: Element): LineageColours {
  const style = getComputedStyle(element);
  const read = (name: string) => style.getPropertyValue(`--${name}`).trim();
  return {
    ink: read('ink'),
    muted: read('ink-3'),
    card: read('card'),
    edge: read('ink-3'),
    ember: read('ember'),
    shell: read('shell'),
  };
}

const shapes = { male: 'rectangle', female: 'ellipse', unknown: 'diamond' } as const;

/** A dot for a certain carrier, a slash for one that died, as pedigrees are drawn; null for neither. */
function overlay(dot: boolean, dead: boolean, colours: LineageColours, filled: boolean): string | null {
  if (!dot && !dead) return null;
  const circle = dot ? `<circle cx="20" cy="20" r="5.5" fill="${colours.ink}"/>` : '';
  const slash = dead
    ? `<path d="M2 38 38 2" stroke="${filled ? colours.card : colours.ink}" stroke-width="2.5"/>`
    : '';
  return `data:image/svg+xml;utf8,${encodeURIComponent(`<svg xmlns="http://www.w3.org/2000/svg" width="40" height="40" viewBox="0 0 40 40">${circle}${slash}</svg>`)}`;
}

export interface NodeData {
  id: string;
  label: string;
  sex: 'male' | 'female' | 'unknown';
  shows: boolean;
  carries: number;
  dead: boolean;
}

/** Looks of one symbol. Part-filled from below up to the probability that it carries a copy. */
export function looksOf(data: NodeData, colours: LineageColours): Record<string, string | number> {
  const percent = Math.round(data.carries * 100);
  const isPart = !data.shows && percent > 0 && percent < 100;
  const picture = overlay(!data.shows && percent === 100, data.dead, colours, data.shows);
  return {
    shape: shapes[data.sex],
    ...(isPart
      ? {
          'background-fill': 'linear-gradient',
          'background-gradient-direction': 'to-top',
          'background-gradient-stop-colors': `${colours.muted} ${colours.muted} ${colours.card} ${colours.card}`,
          'background-gradient-stop-positions': `0% ${percent}% ${percent}% 100%`,
        }
      : { 'background-fill': 'solid', 'background-color': data.shows ? colours.ink : colours.card }),
    ...(picture
      ? { 'background-image': picture, 'background-fit': 'cover', 'background-clip': 'node' }
      : { 'background-image': 'none' }),
  };
}

/** Looks that all symbols and lines share. */
export function styleOf(colours: LineageColours): StylesheetJson {
  return [
    {
      selector: 'node.animal',
      style: {
        width: 26,
        height: 26,
        'border-width': 1.6,
        'border-color': colours.ink,
        label: 'data(label)',
        'font-family': 'ui-monospace, monospace',
        'font-size': 10,
        color: colours.ink,
        'text-valign': 'bottom',
        'text-margin-y': 4,
        'text-background-color': colours.shell,
        'text-background-opacity': 0.85,
        'min-zoomed-font-size': 6,
      },
    },
    { selector: 'node.unknown', style: { width: 30, height: 30 } },
    {
      selector: 'node.hidden',
      style: { 'border-style': 'dashed', 'border-color': colours.muted, color: colours.muted },
    },
    { selector: 'node.root', style: { 'border-width': 3.2 } },
    {
      selector: 'node.mating',
      style: { width: 1, height: 1, 'background-color': colours.edge, 'border-width': 0, events: 'no' },
    },
    {
      selector: 'edge',
      style: { width: 1.3, 'line-color': colours.edge, 'curve-style': 'straight', events: 'no' },
    },
    {
      selector: 'edge.around',
      style: {
        'curve-style': 'taxi',
        'taxi-direction': 'downward',
        'taxi-turn': '-6px',
        'taxi-turn-min-distance': 1,
      },
    },
    {
      selector: 'edge.young',
      style: {
        'curve-style': 'taxi',
        'taxi-direction': 'downward',
        'taxi-turn': '-24px',
        'taxi-turn-min-distance': 1,
      },
    },
    { selector: 'edge.possible', style: { 'line-style': 'dashed' } },
    // Two lines: the gap is as wide as the edge, the lines are its outline.
    {
      selector: 'edge.related',
      style: {
        width: 2.4,
        'line-color': colours.shell,
        'line-outline-width': 1.3,
        'line-outline-color': colours.ink,
      },
    },
    {
      selector: 'node.focused',
      style: { 'outline-width': 3, 'outline-color': colours.ember, 'outline-offset': 3 },
    },
    { selector: 'node.line', style: { 'border-color': colours.ember } },
  ];
}
