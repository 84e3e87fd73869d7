import { ballPython } from './catalogue/ball-python';
import { boa } from './catalogue/boa';
import { cornSnake } from './catalogue/corn-snake';
import { leopardGecko } from './catalogue/leopard-gecko';
import type { CatalogueSpecies } from './catalogue/species';

/** Species and loci to begin with, each with its source; a workspace adds its own. */
export const CATALOGUE: readonly CatalogueSpecies[] = [ballPython, cornSnake, leopardGecko, boa];
