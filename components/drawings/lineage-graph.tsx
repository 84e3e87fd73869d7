'use client';

import type cytoscapeLibrary from 'cytoscape';
import type { Core, ElementDefinition } from 'cytoscape';
import { Maximize, ZoomIn, ZoomOut } from 'lucide-react';
import { useEffect, useMemo, useRef, useState, type KeyboardEvent } from 'react';
import { IconButton } from '@/components/ui/icon-button';
import { Spinner } from '@/components/ui/spinner';
import {
  matingsOf,
  neighbourOf,
  placeMatings,
  type LineageAnimal,
  type Mating,
  type Point,
} from './lineage-elements';
import { looksOf, readColours, styleOf, type NodeData } from './lineage-style';

export interface LineageGraphProps {
  animals: readonly LineageAnimal[];
  relatedMates: readonly (readonly [string, string])[];
  root: string | null;
  /** The animal that has the keyboard and the ring around it. */
  focused: string | null;
  onFocus: (key: string) => void;
  onOpen: (key: string) => void;
  /** What a screen reader says of an animal when it gets the focus. */
  describe: (key: string) => string;
}

/** From here on the best ranks take too long to find (half a minute for a thousand animals); tight ones take a second. */
const MANY_MATINGS = 60;

const arrows = { ArrowUp: 'up', ArrowDown: 'down', ArrowLeft: 'left', ArrowRight: 'right' } as const;

/**
 * A pedigree in the standard symbols: square male, circle female, diamond unknown; filled shows the locus, a dot carries
 * it, part-filled may carry it; a double line mates relatives; a slash has died.
 */
export function LineageGraph({
  animals,
  relatedMates,
  root,
  focused,
  onFocus,
  onOpen,
  describe,
}: LineageGraphProps) {
  const box = useRef<HTMLDivElement>(null);
  const graph = useRef<Core | null>(null);
  const [drawn, setDrawn] = useState<string | null>(null);
  const matings = useMemo(() => matingsOf(animals, relatedMates), [animals, relatedMates]);
  const byKey = useMemo(() => new Map(animals.map((animal) => [animal.key, animal])), [animals]);
  const callbacks = useRef({ onFocus, onOpen });
  useEffect(() => {
    callbacks.current = { onFocus, onOpen };
  });
  // What stands where depends on who is related to whom only; a change of the colours does not move anybody.
  const structure =
    matings.map(({ id, young, related }) => `${id}:${young.join()}:${related}`).join(';') +
    animals.map(({ key }) => key).join();
  const ready = drawn === structure;
  const shown = useRef({ animals, matings, root });
  useEffect(() => {
    shown.current = { animals, matings, root };
  });

  useEffect(() => {
    let cancelled = false;
    const draw = async () => {
      const [{ default: cytoscape }, { default: dagre }] = await Promise.all([
        import('cytoscape'),
        import('cytoscape-dagre'),
      ]);
      const container = box.current;
      if (cancelled || !container) return;
      registerDagre(cytoscape, dagre);
      const cy = cytoscape({
        container,
        elements: elementsOf(shown.current.animals, shown.current.matings, shown.current.root),
        style: styleOf(readColours(container)),
        minZoom: 0.04,
        maxZoom: 3,
        autoungrabify: true,
        boxSelectionEnabled: false,
        // Thousands of lines are moved as a picture and drawn anew when the hand rests.
        textureOnViewport: shown.current.animals.length > 400,
        hideEdgesOnViewport: false,
      });
      layOut(cy, shown.current.matings);
      colour(cy, container);
      cy.on('tap', 'node.animal', ({ target }) => callbacks.current.onFocus(String(target.id())));
      cy.on('dbltap', 'node.animal', ({ target }) => callbacks.current.onOpen(String(target.id())));
      showStart(cy, shown.current.root);
      graph.current = cy;
      setDrawn(structure);
    };
    void draw();
    return () => {
      cancelled = true;
      graph.current?.destroy();
      graph.current = null;
    };
  }, [structure]);

  // New colours: another locus, or the other theme.
  useEffect(() => {
    const cy = graph.current;
    const container = box.current;
    if (!ready || !cy || !container) return undefined;
    cy.batch(() => {
      for (const animal of animals) cy.getElementById(animal.key).data(dataOf(animal));
    });
    colour(cy, container);
    const repaint = () => {
      cy.style(styleOf(readColours(container)));
      colour(cy, container);
    };
    const watcher = new MutationObserver(repaint);
    watcher.observe(document.documentElement, { attributes: true, attributeFilter: ['class', 'data-theme'] });
    const system = window.matchMedia('(prefers-color-scheme: dark)');
    system.addEventListener('change', repaint);
    return () => {
      watcher.disconnect();
      system.removeEventListener('change', repaint);
    };
  }, [animals, ready]);

  useEffect(() => {
    const cy = graph.current;
    if (!ready || !cy) return;
    cy.nodes('.focused').removeClass('focused');
    if (!focused) return;
    const node = cy.getElementById(focused);
    node.addClass('focused');
    const seen = cy.extent();
    const at = node.nonempty() ? node.position() : null;
    if (at && (at.x < seen.x1 + 20 || at.x > seen.x2 - 20 || at.y < seen.y1 + 20 || at.y > seen.y2 - 20))
      cy.animate({ center: { eles: node } }, { duration: 160 });
  }, [focused, ready]);

  const onKeyDown = (event: KeyboardEvent) => {
    const cy = graph.current;
    if (!cy) return;
    const current = focused ?? root ?? animals[0]?.key ?? null;
    if (event.key === 'Enter' && current) onOpen(current);
    else if (event.key === '+' || event.key === '=') zoomBy(cy, 1.3);
    else if (event.key === '-') zoomBy(cy, 1 / 1.3);
    else if (event.key === '0') cy.fit(undefined, 30);
    else if (event.key in arrows && current) {
      const places = new Map(
        cy.nodes('.animal').map((node): [string, Point] => [node.id(), node.position()]),
      );
      const next = focused
        ? neighbourOf(current, arrows[event.key as keyof typeof arrows], byKey, matings, places)
        : current;
      if (next) onFocus(next);
    } else return;
    event.preventDefault();
  };

  return (
    <div className="relative h-full min-h-96 overflow-hidden rounded-xl border border-rule bg-shell">
      <div
        ref={box}
        role="application"
        tabIndex={0}
        aria-label="Lineage graph. Arrow keys go to parents, young and along the row, Enter opens the record, plus and minus zoom. The table says the same."
        onKeyDown={onKeyDown}
        className="h-full w-full focus-visible:outline-2 focus-visible:-outline-offset-2 focus-visible:outline-focus"
      />
      <p aria-live="polite" className="sr-only">
        {focused ? describe(focused) : ''}
      </p>
      {ready ? null : (
        <div
          role="status"
          aria-label="Drawing the lineage"
          className="absolute inset-0 grid place-items-center"
        >
          <Spinner className="size-6" />
        </div>
      )}
      <div className="absolute right-3 bottom-3 flex gap-1">
        <IconButton framed label="Zoom out" onClick={() => graph.current && zoomBy(graph.current, 1 / 1.3)}>
          <ZoomOut aria-hidden />
        </IconButton>
        <IconButton framed label="Zoom in" onClick={() => graph.current && zoomBy(graph.current, 1.3)}>
          <ZoomIn aria-hidden />
        </IconButton>
        <IconButton framed label="Show everything" onClick={() => graph.current?.fit(undefined, 30)}>
          <Maximize aria-hidden />
        </IconButton>
      </div>
    </div>
  );
}

let hasDagre = false;
function registerDagre(
  cytoscape: typeof cytoscapeLibrary,
  dagre: Parameters<typeof cytoscapeLibrary.use>[0],
): void {
  if (!hasDagre) cytoscape.use(dagre);
  hasDagre = true;
}

function dataOf(animal: LineageAnimal): NodeData {
  return {
    id: animal.key,
    label: animal.shown ? animal.code : '?',
    sex: animal.sex,
    shows: animal.fill?.shows ?? false,
    carries: animal.fill?.carries ?? 0,
    dead: animal.dead,
  };
}

function elementsOf(
  animals: readonly LineageAnimal[],
  matings: readonly Mating[],
  root: string | null,
): ElementDefinition[] {
  const nodes = animals.map((animal): ElementDefinition => ({
    data: dataOf(animal),
    classes: ['animal', animal.sex, animal.shown ? '' : 'hidden', animal.key === root ? 'root' : ''].join(
      ' ',
    ),
  }));
  const keys = new Set(animals.map(({ key }) => key));
  const lines = matings.flatMap(({ id, sires, dam, young, related }): ElementDefinition[] => [
    { data: { id }, classes: 'mating' },
    ...[...sires, ...(dam ? [dam] : [])]
      .filter((parent) => keys.has(parent))
      .map((parent) => ({
        data: { source: parent, target: id },
        classes: `mate around ${related ? 'related' : ''} ${sires.length > 1 && parent !== dam ? 'possible' : ''}`,
      })),
    ...young.map((child) => ({ data: { source: id, target: child }, classes: 'young' })),
  ]);
  return [...nodes, ...lines];
}

/** Generations from top to bottom by dagre, then matings moved onto the line between parents who stand side by side. */
function layOut(cy: Core, matings: readonly Mating[]): void {
  const options = {
    name: 'dagre',
    rankDir: 'TB',
    nodeSep: 26,
    rankSep: 34,
    edgeSep: 6,
    ranker: matings.length > MANY_MATINGS ? 'tight-tree' : 'network-simplex',
    animate: false,
    fit: false,
  };
  cy.layout(options).run();
  const places = new Map(
    cy.nodes('.animal').map((node): [string, Point] => [node.id(), { ...node.position() }]),
  );
  const beside = placeMatings(matings, places);
  cy.batch(() => {
    matings.forEach(({ id }, index) => {
      const node = cy.getElementById(id);
      const place = beside.get(id);
      if (place) {
        node.position(place);
        node.connectedEdges('.mate').removeClass('around');
        return;
      }
      // Bars below a row of parents stand a little apart, so that two of them do not read as one.
      node.position('y', node.position('y') + ((index % 5) - 2) * 4);
    });
  });
}

function colour(cy: Core, container: Element): void {
  const colours = readColours(container);
  cy.batch(() =>
    cy.nodes('.animal').forEach((node) => void node.style(looksOf(node.data() as NodeData, colours))),
  );
}

/** Everything if it can be read then; otherwise the root with its nearest relatives, or the middle of the oldest row. */
function showStart(cy: Core, root: string | null): void {
  cy.fit(undefined, 30);
  if (cy.zoom() > 1.4) cy.zoom(1.4);
  cy.center();
  if (cy.zoom() >= 0.55) return;
  const middle = cy.elements().boundingBox();
  const oldest = cy
    .nodes('.animal')
    .sort((a, b) => distance(a.position()) - distance(b.position()))
    .first();
  function distance({ x, y }: Point): number {
    return Math.abs(x - (middle.x1 + middle.x2) / 2) + 4 * (y - middle.y1);
  }
  cy.zoom(root ? 0.9 : 0.6);
  cy.center(root ? cy.getElementById(root) : oldest);
  if (!root) cy.panBy({ x: 0, y: -cy.height() / 3 });
}

function zoomBy(cy: Core, factor: number): void {
  cy.zoom({ level: cy.zoom() * factor, renderedPosition: { x: cy.width() / 2, y: cy.height() / 2 } });
}
